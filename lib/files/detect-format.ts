import { parseNumber } from './parse-number';
import { splitLine } from './split-cells';
import type { Decimal, Delimiter } from './table';

/** Ties go to the earlier one: a tab or a semicolon is hardly ever anything else. */
const CANDIDATES: readonly Delimiter[] = ['tab', 'semicolon', 'comma', 'blanks'];
const SAMPLE_LINES = 50;

export interface Format {
  delimiter: Delimiter;
  decimal: Decimal;
}

/**
 * The delimiter and decimal mark under which the first lines read best as numbers: each cell that
 * is a number counts for, each that is not counts half against; a line of one cell counts nothing.
 */
export function detectFormat(lines: readonly string[], given: Partial<Format> = {}): Format {
  const filled = lines.filter((line) => line.trim() !== '');
  // The first line is often a header, whose words and units would be split at blanks.
  const sample = filled.slice(filled.length > 1 ? 1 : 0, SAMPLE_LINES);
  const delimiters = given.delimiter ? [given.delimiter] : CANDIDATES;
  const decimals: readonly Decimal[] = given.decimal ? [given.decimal] : ['point', 'comma'];
  let best: Format = { delimiter: delimiters.at(-1) ?? 'blanks', decimal: decimals[0] ?? 'point' };
  let bestScore = 0;
  for (const delimiter of delimiters) {
    const rows = sample.map((line) => splitLine(line, delimiter));
    for (const decimal of decimals) {
      const score = rows.reduce((sum, cells) => sum + scoreRow(cells, decimal), 0);
      if (score > bestScore) [best, bestScore] = [{ delimiter, decimal }, score];
    }
  }
  return best;
}

function scoreRow(cells: readonly string[], decimal: Decimal): number {
  if (cells.length < 2) return 0;
  const filled = cells.filter((cell) => cell !== '');
  const numbers = filled.filter((cell) => parseNumber(cell, decimal) !== null).length;
  return numbers - (filled.length - numbers) / 2;
}
