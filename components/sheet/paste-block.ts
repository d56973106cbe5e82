import { parseNumber } from '@/lib/files/parse-number';
import { parsePasted } from '@/lib/files/parse-pasted';

interface PastedBlock {
  cells: string[][];
  /** One sentence of what was taken and what was not. */
  words: string;
}

/** Whether a paste is more than one cell; a single cell is left to the input itself. */
export function isBlock(text: string): boolean {
  return /[\t\n\r]/.test(text.trim());
}

/**
 * The block of a paste, fitted to `columnsLeft` columns. A first line in which no cell is a number
 * while the next one has numbers is a heading and is left out; so are columns beyond the grid.
 */
export function pastedBlock(text: string, columnsLeft: number): PastedBlock {
  const lines = linesOf(text);
  const heading = lines.length > 1 && !hasNumber(lines[0] ?? []) && hasNumber(lines[1] ?? []);
  const kept = heading ? lines.slice(1) : lines;
  const widest = Math.max(0, ...kept.map((cells) => cells.length));
  const words = [`Pasted ${count(kept.length, 'row')}.`];
  if (heading) words.push('The heading line was left out.');
  if (widest > columnsLeft)
    words.push(`${count(widest - columnsLeft, 'column')} beyond the last one left out.`);
  return { cells: kept.map((cells) => cells.slice(0, columnsLeft)), words: words.join(' ') };
}

/** One column of decimal commas looks like two columns between commas; alone on its line it is a number. */
function linesOf(text: string): string[][] {
  const lines = text.split(/\r\n|\n|\r/).filter((line) => line.trim() !== '');
  const oneColumn = lines.every((line) => parseNumber(line, 'comma') !== null);
  return oneColumn ? lines.map((line) => [line.trim()]) : parsePasted(text);
}

function hasNumber(cells: readonly string[]): boolean {
  return cells.some(
    (cell) => parseNumber(cell, 'point') !== null || parseNumber(cell, 'comma') !== null,
  );
}

function count(howMany: number, what: string): string {
  return `${howMany} ${what}${howMany === 1 ? '' : 's'}`;
}
