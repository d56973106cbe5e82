import { AppError } from '@/lib/errors';
import {
  AGREEMENT_TOLERANCE,
  carrierProfile,
  defaultDepthGrid,
  fit,
  InversionError,
  prepareFit,
  runChecks,
  type CarrierProfile,
  type Check,
  type FitAnswer,
  type FitInput,
  type ProfilePoint,
} from '@/lib/inversion/index';

import { bandsOn } from './bands-on';

export interface Recomputed {
  answer: FitAnswer;
  carrierProfile: CarrierProfile;
  checks: Check[];
  /**
   * The same profile a hair above and a hair below each depth. Where a profile or a band jumps, and
   * grids do have depths there, the last bit of an edge decides on which side a depth falls.
   */
  beside: readonly [readonly ProfilePoint[], readonly ProfilePoint[]];
}

interface Wanted {
  seed: number;
  /** 0 for bands from the covariance. */
  resamples: number;
  /** The grid of the library when left out. */
  depthsNm?: readonly number[];
}

/** The whole answer from the inputs alone, with the same library as the browser's. */
export async function recompute(input: FitInput, wanted: Wanted): Promise<Recomputed> {
  try {
    const prepared = prepareFit(input);
    const outcome = fit(prepared);
    if (outcome.status === 'no-minimum') throw new AppError('invalid', outcome.reason);
    const { answer } = outcome;
    const depthsNm = Float64Array.from(wanted.depthsNm ?? defaultDepthGrid(prepared, answer));
    const tried = withNeighbours(depthsNm);
    const bands = await bandsOn(prepared, answer, tried, wanted);
    const { points, ...rest } = carrierProfile(prepared, answer, bands, { depthsNm: tried });
    const count = depthsNm.length;
    const profile = { ...rest, points: points.slice(0, count) };
    return {
      answer,
      carrierProfile: profile,
      checks: runChecks(prepared, answer, profile),
      beside: [points.slice(count, 2 * count), points.slice(2 * count)],
    };
  } catch (cause) {
    if (!(cause instanceof InversionError)) throw cause;
    throw new AppError('invalid', cause.message, {}, { cause });
  }
}

/** All depths, then all a hair shallower, then all a hair deeper. */
function withNeighbours(depthsNm: Float64Array): Float64Array {
  const hairNm = AGREEMENT_TOLERANCE * (depthsNm.at(-1) ?? 0);
  const count = depthsNm.length;
  const all = new Float64Array(3 * count);
  depthsNm.forEach((depthNm, index) => {
    all[index] = depthNm;
    all[count + index] = depthNm - hairNm;
    all[2 * count + index] = depthNm + hairNm;
  });
  return all;
}
