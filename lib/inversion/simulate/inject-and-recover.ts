import { InversionError } from '../errors';
import { fit } from '../fit/fit';
import { prepareFit } from '../fit/prepare-fit';
import type { PreparedFit } from '../fit/prepared-fit';
import { createRefit, expectedRows, observe } from '../fit/refit';
import { thetaOf } from '../fit/theta-of';
import { normalStream } from '../statistics/random';
import type { FitInput, Interval, ParameterName, ParameterValues } from '../types';
import { checkBlock, type SeededBlock } from './check-block';
import { noiseOf } from './draw-noise';

export interface Injection {
  /** Energies, σ or covariance, settings and priors; the values of the points are not read. */
  input: FitInput;
  /**
   * The truth: any values, or those of a fit (`valuesOf`). A parameter with a prior is drawn from its prior instead; a held one left
   * out has its held value.
   */
  values: ParameterValues;
  /** Scatter of the simulated points over what they state; 1 when left out. 2 plays points whose σ are stated half too small. */
  noiseFactor?: number;
  /** Parameters whose profile-likelihood intervals are wanted; all free ones when left out. The others have linear intervals. */
  intervalsFor?: readonly ParameterName[];
}

export interface RecoveredParameter {
  name: ParameterName;
  truth: number;
  value: number;
  sigma: number | null;
  interval68: Interval;
  interval95: Interval;
}

/** One simulated scan fitted: its free parameters, or null where the fit had no minimum. */
export type RecoveredScan = readonly RecoveredParameter[] | null;

/**
 * Closure: scans are simulated from a truth, with the noise that the points state, and fitted as if they were measured.
 * `recoveryReport` says of any number of blocks whether the fit finds the truth again and whether its uncertainties hold.
 *
 * The truth of a parameter with a prior is drawn from the prior for each scan, within the bounds of the parameter: that is what
 * the prior says of it. Row r depends on (seed, first + r) alone.
 *
 * @throws InversionError for input that a fit cannot start from, values that the trial profile cannot take, or a bad block.
 */
export function injectAndRecover(
  { input, values, noiseFactor = 1, intervalsFor }: Injection,
  block: SeededBlock,
): RecoveredScan[] {
  checkBlock(block);
  if (!(noiseFactor > 0 && Number.isFinite(noiseFactor))) {
    throw new InversionError(
      'bad-noise',
      `The noise factor must be a positive number, not ${noiseFactor}.`,
    );
  }
  const prepared = prepareFit(input);
  const again = createRefit(prepared);
  const noise = noiseOf(prepared);
  const rows = new Float64Array(prepared.problem.model.rowCount);
  return Array.from({ length: block.count }, (_, r) => {
    const normal = normalStream(block.seed, block.first + r);
    const truth = drawTruth(prepared, values, normal);
    noise(normal, rows);
    const expected = expectedRows(prepared, truth);
    for (let i = 0; i < rows.length; i++) rows[i] = expected[i]! + noiseFactor * rows[i]!;
    observe(again, rows, prepared.problem.data.priorMean);
    const outcome = fit(again.prepared, intervalsFor ? { intervalsFor } : {});
    if (outcome.status === 'no-minimum') return null;
    return outcome.answer.parameters
      .filter(({ held }) => !held)
      .map(({ name, value, sigma, interval68, interval95 }) => ({
        name,
        truth: truth[name]!,
        value,
        sigma,
        interval68,
        interval95,
      }));
  });
}

/** Draws outside the bounds before the mean of the prior is taken as it is. */
const MOST_DRAWS = 100;

function drawTruth(
  prepared: PreparedFit,
  values: ParameterValues,
  normal: () => number,
): ParameterValues {
  const { model, data } = prepared.problem;
  const given = { ...values };
  model.names.forEach((name, k) => {
    const inverse = model.priorInverseSigma[k]!;
    if (!(inverse > 0)) return;
    given[name] = model.neutral[k]!;
    for (let draw = 0; draw < MOST_DRAWS; draw++) {
      const value = data.priorMean[k]! + normal() / inverse;
      if (value < model.lower[k]! || value > model.upper[k]!) continue;
      given[name] = value;
      break;
    }
  });
  const theta = thetaOf(prepared, given);
  return Object.fromEntries(model.names.map((name, k) => [name, theta[k]!]));
}
