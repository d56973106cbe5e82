/** The numbers behind a figure. Cells keep full precision; text is shown as it is. */
export interface FigureTable {
  /** Headings with their units. */
  columns: readonly string[];
  rows: readonly (readonly (string | number | null)[])[];
}

/** Tab-separated text for the clipboard, every number with all its digits; blank where nothing is known. */
export function tableAsText({ columns, rows }: FigureTable): string {
  const line = (cells: readonly (string | number | null)[]) =>
    cells.map((cell) => (cell === null ? '' : String(cell).replace(/[\t\r\n]+/g, ' '))).join('\t');
  return [columns, ...rows].map(line).join('\n') + '\n';
}

/** A number as a table on the page shows it: six significant digits, so that columns stay narrow. */
export function tableCell(cell: string | number | null): string {
  if (cell === null) return '–';
  if (typeof cell === 'string') return cell;
  return String(Number(cell.toPrecision(6))).replace('-', '−');
}
