import {
  createStoppingProfile,
  createStoppingSet,
  InversionError,
  MAX_BINS,
  type StoppingProfile,
  type StoppingSet,
} from '@/lib/inversion/index';
import type { StoppingColumn } from './guess-stopping-layout';
import { fileProblem, type FileProblem } from './problem';
import { readStoppingRows } from './read-stopping-rows';
import { atHeading, energyProblems, withGivenEnergies } from './stopping-energies';
import type { StoppingReadOptions } from './stopping-options';
import type { Table } from './table';

export { guessStoppingLayout, type DepthUnit, type StoppingLayout } from './guess-stopping-layout';
export type { StoppingReadOptions } from './stopping-options';

export interface StoppingReading {
  set: StoppingSet | null;
  problems: FileProblem[];
  warnings: string[];
}

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
