import { InversionError } from '../errors';
import { valuesOf } from '../fit/theta-of';
import type { SeededBlock } from '../simulate/check-block';
import { likelihoodRatioStatistics } from './likelihood-ratio-statistics';
import type { NestedFits } from './nested-fits';

/**
 * A block of the parametric bootstrap of the likelihood ratio (A. C. Davison and D. V. Hinkley, Bootstrap Methods and their
 * Application, 1997, section 4.2): scans are drawn from the simpler fit, with its prior means, and fitted by both.
 *
 * @returns T* = max(0, χ²_simpler − χ²_richer) of each scan; `likelihoodRatioTest` makes a p-value of any number of blocks.
 * @throws InversionError 'not-nested' or 'bad-block'.
 */
export function bootstrapLikelihoodRatio(nested: NestedFits, block: SeededBlock): Float64Array {
  const { prepared, answer } = nested.simpler;
  return likelihoodRatioStatistics(nested, { prepared, values: valuesOf(answer) }, block);
}

export interface LikelihoodRatioTest {
  /** T = max(0, χ²_simpler − χ²_richer) of the scan itself. */
  statistic: number;
  /** (1 + #{T* ≥ T})/(1 + B); its floor is 1/(1 + B). A statistic of 0 has p = 1. */
  pValue: number;
  /** Monte-Carlo standard error √(p(1 − p)/(1 + B)). */
  standardError: number;
  /** B. */
  resamples: number;
  /** No T* came up to T: only more resamples could make p smaller. */
  atFloor: boolean;
}

/**
 * p = (1 + #{T* ≥ T})/(1 + B) (Davison and Hinkley 1997, equation 4.11): how often the simpler model would give a scan that
 * asks for the richer one at least as loudly.
 *
 * @throws InversionError 'no-resamples' for no statistic at all or one that is not a number.
 */
export function likelihoodRatioTest(
  { simpler, richer }: NestedFits,
  statistics: ArrayLike<number>,
): LikelihoodRatioTest {
  const drawn = Array.from(statistics);
  if (drawn.length === 0 || drawn.some((value) => !Number.isFinite(value))) {
    throw new InversionError(
      'no-resamples',
      'The bootstrap test needs at least one resample, and a finite statistic from each.',
    );
  }
  const statistic = Math.max(0, simpler.answer.chiSquare - richer.answer.chiSquare);
  const asLarge = drawn.filter((value) => value >= statistic).length;
  const resamples = drawn.length;
  const pValue = (1 + asLarge) / (1 + resamples);
  return {
    statistic,
    pValue,
    standardError: Math.sqrt((pValue * (1 - pValue)) / (1 + resamples)),
    resamples,
    atFloor: asLarge === 0,
  };
}
