import type { MinimiseScratch } from '../fit/minimise';
import type { Problem } from '../fit/model';
import type { FitParameter, Interval, ParameterName } from '../types';
import { SIGMAS_68, SIGMAS_95 } from './bands';
import { sigmaOf } from './covariance';
import { profileIntervals, type MinimumPoint } from './profile-likelihood';

/** A linear error bar may stand for an interval when each side agrees with it within a third. */
const AGREEMENT = 1 / 3;

export interface ParameterReport {
  parameters: FitParameter[];
  /** A lower minimum met on the way; the report is then void. */
  better: Float64Array | null;
}

/**
 * Values, standard deviations and intervals of all parameters at a minimum. Those in `wanted` get profile-likelihood
 * intervals; other free ones the linear interval, cut at the bounds. Held ones have none.
 */
export function reportParameters(
  problem: Problem,
  scratch: MinimiseScratch,
  minimum: MinimumPoint,
  wanted: readonly ParameterName[],
): ParameterReport {
  const { model } = problem;
  const parameters: FitParameter[] = [];
  for (let k = 0; k < model.size; k++) {
    const name = model.names[k]!;
    const value = minimum.theta[k]!;
    const held = model.held[k] === 1;
    const sigma = held ? null : sigmaOf(minimum.covariance, name);
    const profiled =
      !held && wanted.includes(name) ? profileIntervals(problem, scratch, minimum, k) : null;
    if (profiled?.better) return { parameters, better: profiled.better };
    const linear = (sigmas: number): Interval =>
      sigma === null
        ? [null, null]
        : [
            Math.max(model.lower[k]!, value - sigmas * sigma),
            Math.min(model.upper[k]!, value + sigmas * sigma),
          ];
    const interval68 = profiled?.interval68 ?? linear(SIGMAS_68);
    const atBound = held ? null : boundOf(value, model.lower[k]!, model.upper[k]!);
    parameters.push({
      name,
      value,
      sigma,
      interval68,
      interval95: profiled?.interval95 ?? linear(SIGMAS_95),
      held,
      atBound,
      symmetric:
        atBound === null && agrees(value, sigma, interval68, model.lower[k]!, model.upper[k]!),
    });
  }
  return { parameters, better: null };
}

function boundOf(value: number, lower: number, upper: number): 'lower' | 'upper' | null {
  if (value <= lower) return 'lower';
  return value >= upper ? 'upper' : null;
}

function agrees(
  value: number,
  sigma: number | null,
  [lower, upper]: Interval,
  lowest: number,
  highest: number,
): boolean {
  if (sigma === null || lower === null || upper === null || lower <= lowest || upper >= highest)
    return false;
  return [value - lower, upper - value].every(
    (side) => Math.abs(side - sigma) <= AGREEMENT * sigma,
  );
}
