import { detectFormat } from './detect-format';
import { splitRows } from './split-cells';

/**
 * Cells of what was copied from a spreadsheet (tabs) or from a text (commas, semicolons, blanks).
 * Cells stay as they were written; rows that are blank throughout are left out.
 */
export function parsePasted(text: string): string[][] {
  const lines = text.replace(/^\ufeff/, '').split(/\r\n|\n|\r/);
  // A tab says that it came from a spreadsheet, also where most cells are empty or words.
  const delimiter = text.includes('\t') ? 'tab' : detectFormat(lines).delimiter;
  return splitRows(lines, delimiter).rows.map((row) => row.cells);
}
