import { AppError } from '@/lib/errors';
import {
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
} from '@/lib/inversion/index';

import { bandsOn } from './bands-on';

export interface Recomputed {
  answer: FitAnswer;
  carrierProfile: CarrierProfile;
  checks: Check[];
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
    const bands = await bandsOn(prepared, answer, depthsNm, wanted);
    const profile = carrierProfile(prepared, answer, bands, { depthsNm });
    return { answer, carrierProfile: profile, checks: runChecks(prepared, answer, profile) };
  } catch (cause) {
    if (!(cause instanceof InversionError)) throw cause;
    throw new AppError('invalid', cause.message, {}, { cause });
  }
}
