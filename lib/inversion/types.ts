/**
 * The vocabulary of the inversion. Units are in the names: depth nm, energy keV,
 * concentration cm⁻³, rate µs⁻¹, capture coefficient γ cm³ s⁻¹. Fractions run 0 to 1.
 */

/** What the scan measures: a diamagnetic fraction (0 to 1) or a capture rate (µs⁻¹). */
export type Observable = 'fraction' | 'rate';

/** One stopping profile: a histogram of stopping depths of muons implanted at one energy. */
export interface StoppingProfile {
  energyKeV: number;
  /** B + 1 ascending bin edges, nm below the surface of the stack (cap included). */
  edgesNm: Float64Array;
  /** B masses ≥ 0 with Σ = 1 over the muons that stopped inside the bins. */
  mass: Float64Array;
  /** Share of the implanted muons that did not stop inside the bins; null when the file does not say. */
  lostShare: number | null;
  /** The two energies (keV) between which it was interpolated by quantiles; null when it came from a file. */
  interpolatedBetween: readonly [number, number] | null;
}

/** Stopping profiles of one layer stack in ascending energy. */
export interface StoppingSet {
  profiles: readonly StoppingProfile[];
}

export interface ScanPoint {
  energyKeV: number;
  value: number;
  sigma: number;
  /** A point switched off stays in the scan and out of the fit. */
  enabled: boolean;
}

export type ProfileKind = 'sharp' | 'graded' | 'layer' | 'band-bending';

/** depletion: few carriers on the surface side; accumulation: many. */
export type Polarity = 'depletion' | 'accumulation';

/** What the probe sees of a concentration. */
export type Response =
  | { kind: 'two-level' }
  | {
      kind: 'capture-rate';
      /** Capture coefficient γ (cm³ s⁻¹) and its uncertainty, which is a scale error and never part of the band. */
      gammaCm3PerS: number;
      gammaSigmaCm3PerS: number | null;
      /** Λ₀ (µs⁻¹), the rate without carriers. */
      baselinePerUs: number;
    }
  | {
      kind: 'saturating-fraction';
      /** p_half (cm⁻³), the concentration at which half of the charged state is converted back, and its uncertainty. */
      halfPerCm3: number;
      halfSigmaPerCm3: number | null;
    };
export type ResponseKind = Response['kind'];

export type ParameterName =
  | 'edgeDepthNm'
  | 'edgeWidthNm'
  | 'layerThicknessNm'
  | 'farEdgeWidthNm'
  | 'surfacePotentialEv'
  | 'bulkPerCm3'
  | 'levelTop'
  | 'levelBulk'
  | 'levelCap'
  | 'depthScale';

export interface GaussianPrior {
  mean: number;
  sigma: number;
}

/** A parameter is held at `value`, or free (then `value` is only where drawing starts, never where the fit does). */
export interface ParameterSetting {
  held: boolean;
  value: number | null;
  prior: GaussianPrior | null;
}

/** Concentrations outside and inside the populated region, where they are known from elsewhere. */
export interface CarrierScale {
  /** Bulk concentration (cm⁻³); null leaves the profile of a fraction as a populated share. */
  bulkPerCm3: number | null;
  bulkSigmaPerCm3: number | null;
  /** Concentration on the surface side (cm⁻³); null means 0 under depletion. */
  topPerCm3: number | null;
}

/** What band bending, and the checks of an edge, need to know of the semiconductor, at the temperature of the scan. */
export interface SemiconductorBulk {
  /** ε_r, static. */
  relativePermittivity: number;
  temperatureK: number;
  /** n_i, for the minority carriers n_i²/N; null leaves them out. */
  intrinsicPerCm3: number | null;
  /** E_g; only checked against. */
  gapEv?: number | null;
}

/** Everything a fit depends on, and nothing else. */
export interface FitInput {
  observable: Observable;
  points: readonly ScanPoint[];
  /** V: covariance of all points in their order, √V_ii their σ; left out or null where they are independent. */
  covariance?: readonly (readonly number[])[] | null;
  stopping: StoppingSet;
  profile: ProfileKind;
  polarity: Polarity;
  response: Response;
  carriers: CarrierScale;
  /** Thickness of the cap layer in front of the semiconductor, nm; 0 for none. Depths of the profile count from below it. */
  capThicknessNm: number;
  /** Needed for band bending; elsewhere it lets an edge be checked against electrostatics. */
  semiconductor?: SemiconductorBulk | null;
  /**
   * Settings by name; what is missing is free, except depthScale, which is then held at 1, bulkPerCm3 at the bulk concentration
   * and, for band bending and a rate, levelTop at the rate without carriers.
   */
  parameters: Partial<Record<ParameterName, ParameterSetting>>;
}

/** Values by name; a name that the trial profile does not have is absent. */
export type ParameterValues = Partial<Record<ParameterName, number>>;

/** [lower, upper]; null where χ² never rises far enough on that side: the interval is one-sided. */
export type Interval = readonly [number | null, number | null];

export interface FitParameter {
  name: ParameterName;
  value: number;
  /** From the covariance at the minimum; null when held, at a bound, or when the covariance does not exist. */
  sigma: number | null;
  interval68: Interval;
  interval95: Interval;
  held: boolean;
  atBound: 'lower' | 'upper' | null;
  /** Whether `sigma` may stand for the interval: both sides closed, not at a bound, and the two agree within a third. */
  symmetric: boolean;
}

export type Covariance =
  | {
      ok: true;
      names: readonly ParameterName[];
      matrix: readonly (readonly number[])[];
      correlation: readonly (readonly number[])[];
    }
  | { ok: false; reason: string };

export type FitStatus = 'converged' | 'stalled' | 'iteration-limit';

export interface Residual {
  energyKeV: number;
  observed: number;
  sigma: number;
  predicted: number;
  /** (observed − predicted)/σ */
  reduced: number;
  enabled: boolean;
  /** The stopping profile of this energy is interpolated. */
  interpolated: boolean;
}

/** The minimum and what is known of it. */
export interface FitAnswer {
  status: FitStatus;
  parameters: readonly FitParameter[];
  /** Φ at the minimum: data and prior terms. */
  chiSquare: number;
  /** The data term alone. */
  dataChiSquare: number;
  /** Enabled points + priors − free parameters. */
  degreesOfFreedom: number;
  /** Upper tail of χ²; null with no degrees of freedom. */
  pValue: number | null;
  freeParameters: number;
  /** AICc = χ² + 2k + 2k(k+1)/(n−k−1); null when n ≤ k + 1. BIC = χ² + k ln n. */
  aicc: number | null;
  bic: number;
  covariance: Covariance;
  residuals: readonly Residual[];
  /** Evidence of the search: folds tried, starts polished, iterations and the last predicted reduction of χ². */
  evidence: { folds: number; starts: number; iterations: number; predictedReduction: number };
}

export type Flag = 'supported' | 'beyond reach' | 'below floor';

export interface ProfilePoint {
  depthNm: number;
  value: number;
  lower68: number | null;
  upper68: number | null;
  lower95: number | null;
  upper95: number | null;
  flag: Flag;
}

export type ProfileUnit = 'populated share' | 'cm⁻³';

export interface CarrierProfile {
  unit: ProfileUnit;
  /** Where the bands come from; null when there are none. */
  bands: 'delta' | 'bootstrap' | null;
  points: readonly ProfilePoint[];
  /** 95 % stopping quantile of the deepest energy used, below the cap, nm. */
  reachNm: number;
  /** Smallest value that the scan could notice on the poor side; null where it does not apply. */
  floor: number | null;
}

export type CheckState = 'fine' | 'caution' | 'problem';

export interface Check {
  id: string;
  state: CheckState;
  /** A sentence for a non-specialist, with the figure in it. */
  message: string;
}
