import { InversionError } from '../errors';
import { parameterTable, type ParameterRow } from '../fit/parameter-table';
import { profileOf, rowsByEnergy, whitenerOf } from '../fit/scan-rows';
import { compileKernel } from '../fold/kernel';
import type { Whitener } from '../linalg/whitener';
import { trialProfileOf } from '../profile/trial-profiles';
import { stoppingQuantile } from '../stopping/stopping-quantile';
import type { GaussianPrior, StoppingProfile } from '../types';
import { compileProblem } from './compile-problem';
import { checkFreeFormInput, checkReference, type FreeFormInput } from './free-form-input';
import { compileRamps } from './hat-design';
import { rootSpacedKnots } from './knots';
import { priorRows, type CapLevel, type Observation } from './observation';
import { observedLine } from './observed-line';
import {
  createPenalisedWork,
  type ColumnMatrix,
  type PenalisedProblem,
  type PenalisedWork,
} from './penalised';

/** A free-form input checked and compiled. Belongs to one thread: the scratch inside is written by every solve. */
export interface PreparedFreeForm {
  readonly input: FreeFormInput;
  /** Stopping profile of each point of the scan; null for a switched-off point outside the stopping set. */
  readonly profiles: readonly (StoppingProfile | null)[];
  /** Point of each row; rows are in ascending energy, so that the order of a scan changes nothing. */
  readonly pointOfRow: Int32Array;
  readonly knotsNm: Float64Array;
  /** 95 % stopping quantile of the deepest enabled energy, below the cap, nm. */
  readonly reachNm: number;
  readonly scale: number;
  /** Null where the depth scale is held. */
  readonly scalePrior: GaussianPrior | null;
  readonly observation: Observation;
  readonly whitener: Whitener;
  /** Observations: enabled points, and a prior of the cap level. */
  readonly dataCount: number;
  /** W·∂ŷ/∂u and L by the unknowns u; in `problem` they are by the steps of u where it is monotonic. */
  readonly design: ColumnMatrix;
  readonly penalty: ColumnMatrix;
  readonly problem: PenalisedProblem;
  readonly work: PenalisedWork;
}

/**
 * Checks a free-form input and compiles it: stopping profiles, knots, exact folds of the hats, whitening, penalty.
 *
 * @throws InversionError for input that a free-form profile cannot start from.
 */
export function prepareFreeForm(input: FreeFormInput): PreparedFreeForm {
  checkFreeFormInput(input);
  const line = observedLine(input);
  const profiles = input.points.map((point) => profileOf(input.stopping, point));
  const deepest = (quantile: number): number => deepestQuantile(input, profiles, quantile);
  // Levels and depth scale are read as a fit with one sharp edge reads them.
  const asFit = { ...input, profile: 'sharp' } as const;
  const table = parameterTable(asFit, trialProfileOf(asFit, deepest(1)));
  const setting = (name: string) => table.find((row) => row.name === name);
  const depthScale = setting('depthScale')!;
  const scale = depthScale.neutral;
  const below = (quantile: number): number =>
    Math.max(0, deepest(quantile) * scale - input.capThicknessNm);
  if (!(below(0.99) > 0)) {
    throw new InversionError(
      'cap-too-thick',
      `No muon to speak of passes the cap of ${input.capThicknessNm} nm at the energies in use.`,
    );
  }
  const knotsNm = input.knotsNm
    ? Float64Array.from(input.knotsNm)
    : rootSpacedKnots(below(0.99), input.knotCount);
  if (!(knotsNm[0]! < below(1))) {
    throw new InversionError(
      'bad-knots',
      `All knots lie deeper than ${below(1)} nm, where the last muons of the scan stop.`,
    );
  }
  if (input.reference) checkReference(input.reference, knotsNm.length);
  const cap = capLevelOf(
    setting('levelCap'),
    shallowest(input, profiles) * scale < input.capThicknessNm,
  );
  const pointOfRow = rowsByEnergy(input.points, profiles);
  const columns = knotsNm.length + (cap.kind === 'free' ? 1 : 0);
  const rows = pointOfRow.length;
  const observation: Observation = {
    ramps: compileRamps(compileKernel(Array.from(pointOfRow, (point) => profiles[point]!))),
    knotsNm,
    capNm: input.capThicknessNm,
    line,
    cap,
    plain: { rows, columns, values: new Float64Array(rows * columns) },
    offset: new Float64Array(rows),
  };
  const dataCount = input.points.filter(({ enabled }) => enabled).length + priorRows(cap);
  checkCount(input, dataCount, columns - knotsNm.length);
  const whitener = whitenerOf(input, pointOfRow);
  const parts = compileProblem(input, observation, whitener, scale, pointOfRow);
  return {
    input,
    profiles,
    pointOfRow,
    knotsNm,
    reachNm: below(0.95),
    scale,
    scalePrior: depthScale.held ? null : depthScale.prior,
    observation,
    whitener,
    dataCount,
    ...parts,
    work: createPenalisedWork(parts.problem, dataCount),
  };
}

function deepestQuantile(
  { points }: FreeFormInput,
  profiles: readonly (StoppingProfile | null)[],
  quantile: number,
): number {
  return profiles.reduce(
    (deepest, profile, index) =>
      profile && points[index]!.enabled
        ? Math.max(deepest, stoppingQuantile(profile, quantile))
        : deepest,
    0,
  );
}

/** Least depth at which a muon of a point in use stops, nm. */
function shallowest(
  { points }: FreeFormInput,
  profiles: readonly (StoppingProfile | null)[],
): number {
  return Math.min(
    ...profiles.map((profile, index) =>
      profile && points[index]!.enabled ? stoppingQuantile(profile, 0) : Infinity,
    ),
  );
}

/** A free level of a cap in which no muon stops is no unknown at all, unless its prior says something. */
function capLevelOf(row: ParameterRow | undefined, seen: boolean): CapLevel {
  if (!row) return { kind: 'none' };
  if (row.held) return { kind: 'held', value: row.neutral };
  return seen || row.prior ? { kind: 'free', prior: row.prior } : { kind: 'none' };
}

/** The data must decide at least what the penalty does not see: a constant, or a straight line, and a free cap level. */
function checkCount({ difference }: FreeFormInput, dataCount: number, capColumns: number): void {
  const fewest = difference + capColumns;
  if (dataCount > fewest) return;
  throw new InversionError(
    'too-few-points',
    `A free-form profile with ${difference === 1 ? 'first' : 'second'} differences${
      capColumns ? ' and a free cap level' : ''
    } needs more than ${fewest} points in use; there are ${dataCount}.`,
    { points: dataCount, fewest },
  );
}
