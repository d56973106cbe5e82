import { stoppingColumns } from './guess-stopping-layout';
import type { Table } from './table';

/**
 * The energy (keV) of every profile in the order of the tables. An energy typed for a table counts
 * when that table holds one profile; a matrix keeps its headings. Null where nothing names one.
 */
export function profileEnergies(
  tables: readonly Table[],
  typedKeV: readonly (number | null)[],
): (number | null)[] {
  const columns = stoppingColumns(tables);
  return tables.flatMap((table, index) => {
    const found = columns.filter((column) => column.table === table);
    const typed = typedKeV[index] ?? null;
    return found.length === 1 && typed !== null ? [typed] : found.map(({ energyKeV }) => energyKeV);
  });
}
