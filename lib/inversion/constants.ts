/** Largest number of energies in one scan or one stopping set. */
export const MAX_ENERGIES = 200;
/** Largest number of depth bins in one stopping profile. */
export const MAX_BINS = 20_000;
/** Largest file taken in, in bytes. */
export const MAX_FILE_BYTES = 5 * 1024 * 1024;
/** Bootstrap resamples when nothing else is asked for, and the most that may be asked for. */
export const DEFAULT_RESAMPLES = 2_000;
export const MAX_RESAMPLES = 10_000;
/** Depth-scale prior unless the user says otherwise: the usual accuracy of a stopping calculation (common practice, no source). */
export const DEPTH_SCALE_PRIOR = { mean: 1, sigma: 0.03 } as const;
/** A fit and its recomputation agree when every number agrees to this, relative. */
export const AGREEMENT_TOLERANCE = 1e-6;
/** Δχ² of the 68.27 % and 95 % profile-likelihood interval of one parameter (quantiles of χ²₁). */
export const DELTA_CHI_SQUARE_68 = 1;
export const DELTA_CHI_SQUARE_95 = 3.841458820694124;
