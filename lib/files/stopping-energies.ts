import { MAX_ENERGIES } from '@/lib/inversion/index';
import { stoppingColumns, type StoppingColumn } from './guess-stopping-layout';
import { fileProblem, type FileProblem } from './problem';
import type { Table } from './table';

const SAME_ENERGY = 1e-9;

/** Given energies are one per profile, or one per file when there are as many as files (a matrix ignores it). */
export function withGivenEnergies(
  tables: readonly Table[],
  given: readonly (number | null)[],
): StoppingColumn[] {
  const columns = stoppingColumns(tables);
  const perFile = given.length === tables.length && given.length !== columns.length;
  const typedForFile = ({ table }: StoppingColumn) => {
    const isAlone = columns.filter((other) => other.table === table).length === 1;
    return isAlone ? given[tables.indexOf(table)] : null;
  };
  return columns.map((column, index) => {
    const typed = perFile ? typedForFile(column) : given[index];
    return { ...column, energyKeV: typed ?? column.energyKeV };
  });
}

/** Energies that are missing, not above 0, there twice, or too many. */
export function energyProblems(columns: readonly StoppingColumn[]): FileProblem[] {
  const tooMany = columns[MAX_ENERGIES];
  if (tooMany) {
    const place = {
      fileName: tooMany.table.fileName,
      line: tooMany.table.headerLine,
      column: tooMany.column + 1,
    };
    return [
      fileProblem(place, `expected at most ${MAX_ENERGIES} energies, found ${columns.length}.`),
    ];
  }
  const headless = new Set<Table>();
  return columns.flatMap((column, index) => {
    const { table, energyKeV } = column;
    if (energyKeV === null) {
      if (headless.has(table)) return [];
      if (!table.header) headless.add(table);
      return [noEnergy(column)];
    }
    if (energyKeV <= 0)
      return [atHeading(column, `expected an energy above 0 keV, found ${energyKeV}.`)];
    const twin = columns
      .slice(0, index)
      .find(
        (other) =>
          other.energyKeV !== null &&
          Math.abs(other.energyKeV - energyKeV) <= SAME_ENERGY * energyKeV,
      );
    if (!twin) return [];
    const where = twin.table === table ? `column ${twin.column + 1}` : twin.table.fileName;
    return [
      atHeading(
        column,
        `expected each energy once, found ${energyKeV} keV again; ${where} has it already.`,
      ),
    ];
  });
}

function noEnergy(column: StoppingColumn): FileProblem {
  const { table } = column;
  if (table.columnCount === 2) {
    return fileProblem(
      { fileName: table.fileName },
      'expected the energy in the file name (such as 12.5keV.txt) or in a heading; type it in.',
    );
  }
  if (!table.header) {
    return fileProblem(
      { fileName: table.fileName, line: table.rows[0]?.line ?? null },
      'expected a header with the energy of each column (such as “2 keV”); a matrix without one does not say its energies.',
    );
  }
  const heading = table.header[column.column] ?? '';
  return atHeading(
    column,
    `expected a heading with an energy (such as “12.5 keV”), found "${heading}".`,
  );
}

/** A fault of a whole profile, at its heading where the file has headings. */
export function atHeading({ table, column }: StoppingColumn, sentence: string): FileProblem {
  const place = table.header
    ? { fileName: table.fileName, line: table.headerLine, column: column + 1 }
    : { fileName: table.fileName };
  return fileProblem(place, sentence);
}
