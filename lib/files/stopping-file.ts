import {
  createStoppingProfile,
  createStoppingSet,
  InversionError,
  MAX_BINS,
  MAX_ENERGIES,
  type StoppingProfile,
  type StoppingSet,
} from '@/lib/inversion/index';
import { stoppingColumns, type StoppingColumn } from './guess-stopping-layout';
import { fileProblem, type FileProblem } from './problem';
import { readStoppingRows } from './read-stopping-rows';
import type { StoppingReadOptions } from './stopping-options';
import type { Table } from './table';

export { guessStoppingLayout, type DepthUnit, type StoppingLayout } from './guess-stopping-layout';
export type { StoppingReadOptions } from './stopping-options';

export interface StoppingReading {
  set: StoppingSet | null;
  problems: FileProblem[];
  warnings: string[];
}

const SAME_ENERGY = 1e-9;

/**
 * Stopping profiles from one matrix file, from one file per energy, or from a mixture. The set is
 * null as long as anything is wrong; every fault is named by file, line and column.
 */
export function readStoppingFiles(
  tables: readonly Table[],
  options: StoppingReadOptions,
): StoppingReading {
  const named = withGivenEnergies(tables, options.energiesKeV ?? []);
  const problems = [...tableProblems(tables), ...energyProblems(named)];
  if (problems.length > 0) return { set: null, problems, warnings: [] };

  const warnings: string[] = [];
  const profiles: StoppingProfile[] = [];
  for (const table of tables) {
    const columns = named.filter((column) => column.table === table);
    const rows = readStoppingRows(table, columns, options);
    problems.push(...rows.problems);
    warnings.push(...rows.warnings);
    if (rows.problems.length > 0) continue;
    columns.forEach((column, index) => {
      const built = buildProfile(column, rows.positionsNm, rows.weights[index] ?? [], options);
      if (built.ok) profiles.push(built.profile);
      else problems.push(built.problem);
    });
  }
  if (problems.length > 0) return { set: null, problems, warnings };
  return { set: createStoppingSet(profiles), problems, warnings };
}

/** Given energies are one per profile, or one per file when there are as many as files (a matrix ignores it). */
function withGivenEnergies(
  tables: readonly Table[],
  given: readonly (number | null)[],
): StoppingColumn[] {
  const columns = stoppingColumns(tables);
  const perFile = given.length === tables.length && given.length !== columns.length;
  return columns.map((column, index) => {
    const isAlone = columns.filter(({ table }) => table === column.table).length === 1;
    const typed = perFile ? (isAlone ? given[tables.indexOf(column.table)] : null) : given[index];
    return { ...column, energyKeV: typed ?? column.energyKeV };
  });
}

function tableProblems(tables: readonly Table[]): FileProblem[] {
  return tables.flatMap((table) => {
    const { fileName, rows, columnCount } = table;
    const line = rows[0]?.line ?? table.headerLine;
    if (columnCount < 2) {
      return [
        fileProblem(
          { fileName, line },
          'expected a depth column and at least one column of counts, found one column.',
        ),
      ];
    }
    const tooLong = rows[MAX_BINS + 1];
    if (tooLong) {
      return [
        fileProblem(
          { fileName, line: tooLong.line },
          `expected at most ${MAX_BINS} depth bins, found ${rows.length} lines of data.`,
        ),
      ];
    }
    return rows.length < 2
      ? [
          fileProblem(
            { fileName, line },
            `expected at least two lines of depth and counts, found ${rows.length}.`,
          ),
        ]
      : [];
  });
}

function energyProblems(columns: readonly StoppingColumn[]): FileProblem[] {
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

function atHeading({ table, column }: StoppingColumn, sentence: string): FileProblem {
  const place = table.header
    ? { fileName: table.fileName, line: table.headerLine, column: column + 1 }
    : { fileName: table.fileName };
  return fileProblem(place, sentence);
}

type Built = { ok: true; profile: StoppingProfile } | { ok: false; problem: FileProblem };

function buildProfile(
  column: StoppingColumn,
  positionsNm: number[],
  weights: number[],
  options: StoppingReadOptions,
): Built {
  const energyKeV = column.energyKeV ?? Number.NaN;
  const lost = lostShare(weights, options);
  if (lost !== null && lost < -1e-9) {
    const total = weights.reduce((sum, weight) => sum + weight, 0);
    const sentence = `expected no more counts than the ${options.implantedPerEnergy} muons implanted, found ${total} at ${energyKeV} keV.`;
    return { ok: false, problem: atHeading(column, sentence) };
  }
  try {
    const profile = createStoppingProfile({
      energyKeV,
      positionsNm,
      positionsAre: options.positionsAre ?? 'centres',
      weights,
      weightsAre: options.weightsAre,
      lostShare: lost === null ? null : Math.max(0, lost),
    });
    return { ok: true, profile };
  } catch (cause) {
    if (!(cause instanceof InversionError)) throw cause;
    return { ok: false, problem: atHeading(column, cause.message) };
  }
}

function lostShare(weights: readonly number[], options: StoppingReadOptions): number | null {
  if (!options.implantedPerEnergy || options.weightsAre !== 'counts') return null;
  return 1 - weights.reduce((sum, weight) => sum + weight, 0) / options.implantedPerEnergy;
}
