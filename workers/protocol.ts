import type { CarrierProfile, Check, FitAnswer, FitInput } from '@/lib/inversion/index';

/** Relative information of the scan about carriers at each depth, 0 to 1. */
export interface DepthInformation {
  depthsNm: Float64Array;
  values: Float64Array;
}

/** What a fit says at once: the minimum, the profile with delta-method bands, and the checks. */
export interface FirstAnswer {
  answer: FitAnswer;
  profile: CarrierProfile;
  checks: Check[];
  information: DepthInformation;
  /** Share of the information on the edge that each point brings; sums to 1. */
  edgeInformation: number[];
}

/** The profile with bands from resampling, and the checks that look at them. */
export interface BandedAnswer {
  profile: CarrierProfile;
  checks: Check[];
}

/** An error cannot cross to another thread with its code, so a call answers it. */
export type Reply<T> = { ok: true; value: T } | { ok: false; code: string; message: string };

export interface ResampleBlock {
  seed: number;
  /** Number of the first row; row r depends on (seed, r) alone. */
  first: number;
  count: number;
}

/** What a worker can be asked. A job is one fit with its prepared input, kept until it is closed. */
export interface InversionApi {
  /** Answers once the worker has loaded. */
  hello(): Promise<'ready'>;
  /** Prepares the input and fits it. */
  fit(job: number, input: FitInput): Promise<Reply<FirstAnswer>>;
  /** Prepares the input for resampling round an answer that another worker found. */
  adopt(job: number, input: FitInput, answer: FitAnswer): Promise<Reply<'ready'>>;
  /** Rows of free parameters, row-major; null when the job was stopped meanwhile. */
  resample(job: number, block: ResampleBlock): Promise<Reply<Float64Array | null>>;
  /** Bands from all rows of the job. */
  bands(job: number, rows: Float64Array): Promise<Reply<BandedAnswer>>;
  /** Ends the job's resampling at its next breath and forgets the job. */
  close(job: number): Promise<void>;
}
