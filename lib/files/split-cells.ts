import Papa from 'papaparse';
import type { Delimiter, TableRow } from './table';

const CHARACTER = { comma: ',', semicolon: ';', tab: '\t' } as const;

/** Cells of one line between runs of blanks; double quotes hold a cell with blanks together. */
function splitBlanks(line: string): string[] {
  const cells: string[] = [];
  for (const [whole, quoted] of line.matchAll(/"([^"]*)"|\S+/g)) cells.push(quoted ?? whole);
  return cells;
}

/** Cells of a single line, trimmed. */
export function splitLine(line: string, delimiter: Delimiter): string[] {
  if (delimiter === 'blanks') return splitBlanks(line);
  const [cells = []] = Papa.parse<string[]>(line, {
    delimiter: CHARACTER[delimiter],
    newline: '\n',
  }).data;
  return cells.map((cell) => cell.trim());
}

export interface SplitRows {
  rows: TableRow[];
  /** Lines on which a quoted cell is malformed. */
  badQuotes: number[];
}

/** Rows of a whole text with their lines; a quoted cell may run over several lines. Blank lines give no row. */
export function splitRows(lines: readonly string[], delimiter: Delimiter): SplitRows {
  if (delimiter === 'blanks') {
    const rows = lines.map((line, index) => ({ line: index + 1, cells: splitBlanks(line) }));
    return { rows: rows.filter((row) => row.cells.length > 0), badQuotes: [] };
  }
  const parsed = Papa.parse<string[]>(lines.join('\n'), {
    delimiter: CHARACTER[delimiter],
    newline: '\n',
  });
  const rows: TableRow[] = [];
  const lineOfRow: number[] = [];
  let line = 1;
  for (const raw of parsed.data) {
    lineOfRow.push(line);
    const cells = raw.map((cell) => cell.trim());
    if (cells.some((cell) => cell !== '')) rows.push({ line, cells });
    line += 1 + raw.reduce((count, cell) => count + cell.split('\n').length - 1, 0);
  }
  const badQuotes = parsed.errors.map((error) => lineOfRow[error.row ?? 0] ?? 1);
  return { rows, badQuotes };
}
