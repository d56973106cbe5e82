import { parseNumber } from '@/lib/files/parse-number';
import type { FileProblem } from '@/lib/files/problem';
import type { Table } from '@/lib/files/table';

/**
 * Whether leaving out its line would mend a problem: the fault must lie in a cell of that line. A
 * heading without an energy, or a column that is zero throughout, is not mended that way.
 */
export function mayLeaveOut({ line, column }: FileProblem, table: Table | null): boolean {
  const row = table?.rows.find((candidate) => candidate.line === line);
  if (!table || !row || column === null) return false;
  if (column === 1) return true;
  const value = parseNumber(row.cells[column - 1] ?? '', table.decimal);
  return value === null || value < 0;
}
