import Papa from 'papaparse';

export type HeadLine = readonly [key: string, value: string | number];

/**
 * CSV per RFC 4180 (CR LF, quotes only where needed) below head lines `# key: value`.
 * No cell of a spreadsheet that opens the file begins a formula.
 */
export function csvText(
  head: readonly HeadLine[],
  columns: readonly string[],
  rows: readonly (readonly (string | number | null)[])[],
): string {
  const headLines = head.map(([key, value]) => `# ${inOneCell(key)}: ${inOneCell(String(value))}`);
  const cells = rows.map((row) => row.map(cellText));
  const table = Papa.unparse([[...columns], ...cells], { newline: '\r\n' });
  return [...headLines, table].join('\r\n') + '\r\n';
}

/** Numbers as they are to 12 digits (no binary noise after a change of unit); words never as a formula. */
function cellText(cell: string | number | null): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return String(Number(cell.toPrecision(12)));
  return /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell;
}

/**
 * A spreadsheet cuts a head line into cells at commas, semicolons and tabs: whatever would begin a
 * formula behind one of them is defused with an apostrophe, and double quotes and line ends go.
 */
function inOneCell(text: string): string {
  return text
    .replace(/[\r\n\t]+/g, ' ')
    .replace(/"/g, "'")
    .replace(/([,;]\s*)(?=[=+\-@])/g, "$1'");
}
