import type { FitInput, ParameterName, StoppingProfile } from '../types';
import type { MinimiseScratch } from './minimise';
import type { Problem } from './model';

/** A fit input checked and compiled. Belongs to one thread: the scratch inside is written by every fold. */
export interface PreparedFit {
  readonly input: FitInput;
  /** All parameters of the trial profile, in their one order. */
  readonly parameterNames: readonly ParameterName[];
  /** The free ones, in the same order: the columns of a covariance and of resamples. */
  readonly freeNames: readonly ParameterName[];
  /** Stopping profile of each point of the scan; null for a switched-off point outside the stopping set. */
  readonly profiles: readonly (StoppingProfile | null)[];
  /** Deepest depth below the cap where an enabled point has stops, nm, at the neutral depth scale. */
  readonly deepestNm: number;
  readonly priorCount: number;
  readonly enabledCount: number;
  readonly problem: Problem;
  readonly scratch: MinimiseScratch;
  readonly curves: CurveCache;
}

/** Kernels of the smooth curves drawn last, by their energies. */
export interface CurveCache {
  key: string;
  fold: ((theta: Float64Array) => Float64Array) | null;
}
