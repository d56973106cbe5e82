import { InversionError } from '../errors';
import { compileKernel, type Kernel } from '../fold/kernel';
import { whiten } from '../linalg/whitener';
import type { TrialProfile } from '../profile/trial-profile';
import { trialProfileOf } from '../profile/trial-profiles';
import { RESPONSES } from '../response/responses';
import type { FitInput, ScanPoint, StoppingProfile } from '../types';
import { checkInput } from './check-input';
import { meanLevel } from './evaluate';
import type { Data, Model } from './model';
import { depthScaleRow, parameterTable, type ParameterRow } from './parameter-table';
import type { PreparedFit } from './prepared-fit';
import { createRefineScratch } from './refine';
import { rememberBySet } from './remember';
import { profileOf, rowsByEnergy, whitenedValues, whitenerOf } from './scan-rows';
import { foldLattice, weighLattice, type LatticeFolds } from './search-grid';
import { createWorkspace } from './workspace';

/**
 * Checks a fit input and compiles it to typed arrays.
 *
 * @throws InversionError for input that a fit cannot start from, and 'too-few-points' where the enabled points and priors
 * are fewer than the free parameters.
 */
export function prepareFit(input: FitInput): PreparedFit {
  const prepared = compileInput(input);
  const observations = prepared.enabledCount + prepared.priorCount;
  if (observations < prepared.freeNames.length) {
    throw new InversionError(
      'too-few-points',
      `The fit has ${prepared.freeNames.length} free parameters but only ${prepared.enabledCount} points in use${
        prepared.priorCount > 0 ? ` and ${prepared.priorCount} priors` : ''
      }; hold parameters or add points.`,
      {
        freeParameters: prepared.freeNames.length,
        points: prepared.enabledCount,
        priors: prepared.priorCount,
      },
    );
  }
  return prepared;
}

/** prepareFit without the count of points: a template for simulation has none to fit. */
export function compileInput(input: FitInput): PreparedFit {
  checkInput(input);
  const profiles = input.points.map((point) => profileOf(input.stopping, point));
  const enabledCount = input.points.filter((point) => point.enabled).length;
  if (enabledCount === 0)
    throw new InversionError('empty-scan', 'Every point of the energy scan is switched off.');
  const rows = rowsByEnergy(input.points, profiles);
  const scale = depthScaleRow(input).neutral;
  const deepestNm = deepestStop(input.points, profiles) * scale - input.capThicknessNm;
  if (!(deepestNm > 0)) {
    throw new InversionError(
      'cap-too-thick',
      `No muon passes the cap of ${input.capThicknessNm} nm at the energies in use.`,
    );
  }
  const trial = trialProfileOf(input, deepestNm);
  const table = parameterTable(input, trial);
  const model = compileModel(input, trial, table, profiles, rows, deepestNm);
  const data = compileData(input, table, model);
  const free = table.filter((row) => !row.held);
  const size = table.length;
  return {
    input,
    parameterNames: model.names,
    freeNames: free.map((row) => row.name),
    profiles,
    deepestNm,
    priorCount: free.filter((row) => row.prior !== null).length,
    enabledCount,
    problem: { model, data, work: createWorkspace(model), fallback: meanLevel(model, data) },
    scratch: {
      refine: createRefineScratch(size),
      inner: new Float64Array(size),
      innerHeld: new Uint8Array(size),
    },
    curves: { key: '', fold: null },
  };
}

/** Last bin edge of the enabled points that still closes a bin with stops in it. */
function deepestStop(
  points: readonly ScanPoint[],
  profiles: readonly (StoppingProfile | null)[],
): number {
  let deepest = 0;
  profiles.forEach((profile, index) => {
    if (!profile || !points[index]!.enabled) return;
    let last = profile.mass.length;
    while (last > 0 && profile.mass[last - 1] === 0) last--;
    deepest = Math.max(deepest, profile.edgesNm[last]!);
  });
  return deepest;
}

/** A kernel of the largest scan takes 100 MB and a lattice up to 15; the desk goes to and fro between few of them. */
const rememberedKernel = rememberBySet<Kernel>(1);
const rememberedLattice = rememberBySet<LatticeFolds>(4);

/** Everything else that the share seen by the probe depends on. */
function whatIsFolded(input: FitInput): unknown {
  const { profile, polarity, response, carriers, semiconductor, parameters } = input;
  // Polarity and carriers bend nothing where the probe sees the share itself.
  const plain = profile !== 'band-bending' && response.kind !== 'saturating-fraction';
  return plain
    ? profile
    : [profile, polarity, response, carriers, semiconductor, parameters.bulkPerCm3];
}

function compileModel(
  input: FitInput,
  trial: TrialProfile,
  table: readonly ParameterRow[],
  profiles: readonly (StoppingProfile | null)[],
  rows: Int32Array,
  deepestNm: number,
): Model {
  const energies = Array.from(rows, (index) => input.points[index]!.energyKeV).join(' ');
  const kernel = rememberedKernel(input.stopping, energies, () =>
    compileKernel(Array.from(rows, (index) => profiles[index]!)),
  );
  const shapeCount = trial.shape.length;
  const seen = RESPONSES[input.response.kind].seen?.(trial, input) ?? trial;
  const whitener = whitenerOf(input, rows);
  const unit = new Float64Array(rows.length).fill(1);
  whiten(whitener, unit);
  const lattice = {
    capNm: input.capThicknessNm,
    scale: table[table.length - 1]!.neutral,
    heldShape: table.slice(0, shapeCount).map((row) => (row.held ? row.neutral : null)),
    deepestNm,
  };
  const folds = rememberedLattice(
    input.stopping,
    JSON.stringify([energies, lattice, whatIsFolded(input)]),
    () => foldLattice({ kernel, trial: seen, ...lattice }),
  );
  const priorInverseSigma = Float64Array.from(table, (row) =>
    row.prior ? 1 / row.prior.sigma : 0,
  );
  return {
    rowCount: rows.length,
    pointOfRow: rows,
    kernel,
    trial: seen,
    capNm: input.capThicknessNm,
    names: table.map((row) => row.name),
    size: table.length,
    shapeCount,
    widths: trial.edges.flatMap(({ width }) => width ?? []),
    levelCount: table.length - shapeCount - 1,
    scaleIndex: table.length - 1,
    lower: Float64Array.from(table, (row) => row.lower),
    upper: Float64Array.from(table, (row) => row.upper),
    closedLower: Uint8Array.from(table, (row) => (row.closed[0] ? 1 : 0)),
    closedUpper: Uint8Array.from(table, (row) => (row.closed[1] ? 1 : 0)),
    held: Uint8Array.from(table, (row) => (row.held ? 1 : 0)),
    neutral: Float64Array.from(table, (row) => row.neutral),
    priorInverseSigma,
    whitener,
    unit,
    grid: weighLattice(folds, {
      whitener,
      unit,
      levelPriors: priorInverseSigma.subarray(shapeCount, table.length - 1),
    }),
  };
}

function compileData(
  input: FitInput,
  table: readonly ParameterRow[],
  { pointOfRow, whitener }: Model,
): Data {
  return {
    target: whitenedValues(input, pointOfRow, whitener),
    priorMean: Float64Array.from(table, (row) => row.prior?.mean ?? 0),
  };
}
