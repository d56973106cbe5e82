import { parseNumber } from '@/lib/files/parse-number';
import type { FileProblem } from '@/lib/files/problem';
import type { Table } from '@/lib/files/table';

/**
 * A test of whether leaving out its line would mend a problem: the fault must lie in a cell of that
 * line. A heading without an energy, or a column that is zero throughout, is not mended that way.
 */
export function leaveOutTest(tables: readonly (Table | null)[]): (problem: FileProblem) => boolean {
  const rowsOf = new Map(
    tables.flatMap((table) => (table ? [[table.fileName, rowsByLine(table)] as const] : [])),
  );
  return ({ fileName, line, column }) => {
    const found = rowsOf.get(fileName);
    const cells = found?.cells.get(line ?? 0);
    if (!found || !cells || column === null) return false;
    if (column === 1) return true;
    const value = parseNumber(cells[column - 1] ?? '', found.decimal);
    return value === null || value < 0;
  };
}

function rowsByLine({ rows, decimal }: Table) {
  return { decimal, cells: new Map(rows.map(({ line, cells }) => [line, cells])) };
}
