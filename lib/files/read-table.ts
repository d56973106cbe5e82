import { MAX_BINS, MAX_ENERGIES } from '@/lib/inversion/index';
import { decodeText } from './decode-text';
import { detectFormat, type Format } from './detect-format';
import { HEADING, isKnownHeading } from './heading-words';
import { parseNumber, saysNotANumber } from './parse-number';
import { fileProblem, type FileProblem } from './problem';
import { splitLine, splitRows } from './split-cells';
import type { Decimal, Delimiter, Table, TableRow } from './table';

/** A header, a line per depth bin and a closing edge. */
const MOST_LINES = MAX_BINS + 2;
/** Room for a hundred characters in each column of the largest stopping matrix. */
const MOST_CHARACTERS = 100 * MAX_ENERGIES;

export type ReadTableOptions = Partial<Format>;
export type ReadTableResult = { ok: true; table: Table } | { ok: false; problems: FileProblem[] };

/**
 * A delimited or blank-separated text file as a table of cells. Finds out the delimiter and the
 * decimal mark (both may be given instead), comment lines (#, ; or %) and a header, and keeps the
 * line of every row. Nothing is dropped but blank lines and columns that are blank throughout.
 */
export function readTable(
  fileName: string,
  bytes: Uint8Array,
  options: ReadTableOptions = {},
): ReadTableResult {
  const decoded = decodeText(fileName, bytes);
  if (!decoded.ok) return { ok: false, problems: [decoded.problem] };
  const tooMuch = tooMuchProblem(fileName, decoded.lines);
  if (tooMuch) return { ok: false, problems: [tooMuch] };
  const format = detectFormat(decoded.lines.filter(isData), options);
  const { lines, comments } = takeComments(decoded.lines, format);
  const { rows, badQuotes } = splitRows(lines, format.delimiter);
  if (badQuotes.length > 0) {
    return { ok: false, problems: badQuotes.map((line) => quoteProblem(fileName, line)) };
  }
  if (rows.length === 0) {
    return {
      ok: false,
      problems: [
        fileProblem({ fileName }, 'the file holds comments only; expected lines of numbers.'),
      ],
    };
  }
  return { ok: true, table: toTable(fileName, format, rows, comments) };
}

/** Neither blank nor, as far as can be told without the delimiter, a comment. */
function isData(line: string): boolean {
  return /^\s*[^\s#%;]/.test(line);
}

/** Before anything is split: no table that the product takes is longer or wider than this. */
function tooMuchProblem(fileName: string, lines: readonly string[]): FileProblem | null {
  const wide = lines.findIndex((line) => line.length > MOST_CHARACTERS);
  if (wide >= 0) {
    const sentence = `expected at most ${MOST_CHARACTERS} characters on a line, found ${lines[wide]?.length}.`;
    return fileProblem({ fileName, line: wide + 1 }, sentence);
  }
  const filled = lines.filter(isData).length;
  if (filled <= MOST_LINES) return null;
  const sentence = `expected at most ${MAX_BINS} lines of numbers, found ${filled}.`;
  return fileProblem({ fileName }, sentence);
}

function quoteProblem(fileName: string, line: number): FileProblem {
  return fileProblem(
    { fileName, line },
    'a cell opens with a double quote that is not closed properly.',
  );
}

interface WithoutComments {
  /** The lines, with a comment replaced by a blank so that every line keeps its number. */
  lines: string[];
  comments: Table['comments'];
}

function takeComments(original: readonly string[], format: Format): WithoutComments {
  const comments: Table['comments'] = [];
  const keep = (line: number, text: string) =>
    comments.push({ line, text: text.replace(/^[\s#%;]+/, '').trim() });
  const lines = original.map((text, index) => {
    if (isComment(text, format)) {
      keep(index + 1, text);
      return '';
    }
    const tail = format.delimiter === 'blanks' ? text.search(/\s#/) : -1;
    if (tail < 0) return text;
    keep(index + 1, text.slice(tail));
    return text.slice(0, tail);
  });
  return { lines, comments };
}

function isComment(text: string, { delimiter, decimal }: Format): boolean {
  const mark = text.trimStart()[0];
  if (mark === '#' || mark === '%') return true;
  if (mark !== ';') return false;
  // Between semicolons an empty first cell looks like a comment; a line with numbers is a row.
  if (delimiter !== 'semicolon') return true;
  return !splitLine(text, delimiter).some((cell) => parseNumber(cell, decimal) !== null);
}

function toTable(
  fileName: string,
  { delimiter, decimal }: Format,
  rows: TableRow[],
  comments: Table['comments'],
): Table {
  // Not Math.max(...): a file of the largest size has more rows than a call may have arguments.
  const columnCount = rows.reduce((most, row) => Math.max(most, filledLength(row.cells)), 0);
  const trimmed = rows.map(({ line, cells }) => ({ line, cells: cells.slice(0, columnCount) }));
  const [first, ...rest] = trimmed;
  const base = { fileName, delimiter, decimal, comments, columnCount };
  if (first && looksLikeHeader(first.cells, decimal)) {
    return { ...base, header: first.cells, headerLine: first.line, rows: rest };
  }
  const before = comments.filter((comment) => comment.line < (first?.line ?? 0)).at(-1);
  const header = before ? headerInComment(before.text, delimiter, columnCount) : null;
  return { ...base, header, headerLine: header && before ? before.line : null, rows: trimmed };
}

/** Number of cells up to the last that is not blank: a delimiter at the end of a line adds no column. */
function filledLength(cells: readonly string[]): number {
  let length = cells.length;
  while (length > 0 && cells[length - 1] === '') length -= 1;
  return length;
}

/**
 * Words throughout are a header. Words and numbers together are one only when the first cell names
 * a depth (a stopping matrix headed by bare energies); otherwise the row is data with a fault in it,
 * which must be reported and not taken for a heading.
 */
function looksLikeHeader(cells: readonly string[], decimal: Decimal): boolean {
  const filled = cells.filter((cell) => cell !== '');
  const words = filled.filter(
    (cell) => parseNumber(cell, decimal) === null && !saysNotANumber(cell),
  );
  if (words.length === 0) return false;
  return words.length === filled.length || HEADING.depth.test((cells[0] ?? '').toLowerCase());
}

/** Not a remark such as "implanted: 1000" or "depth 320", which only happens to have as many words. */
function headerInComment(text: string, delimiter: Delimiter, columnCount: number): string[] | null {
  const cells = splitLine(text, delimiter);
  const numbers = cells.filter((cell) => parseNumber(cell, 'point') !== null).length;
  const isRemark = numbers === 1 || cells.some((cell) => cell.endsWith(':'));
  const fits = cells.length === columnCount && columnCount > 1 && !isRemark;
  return fits && cells.some(isKnownHeading) ? cells : null;
}
