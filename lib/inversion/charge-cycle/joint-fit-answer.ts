import type { FitStatus, Interval } from '../types';
import type { JointCovariance } from './joint-covariance';
import type { RateMethod } from './joint-problem';

/** Natural logarithm of ν·µs, E_A (meV), Λ_c (µs⁻¹), λ₀ (µs⁻¹). */
export type JointParameterName = 'logAttempt' | 'activationMeV' | 'capturePerUs' | 'baselinePerUs';

export interface JointParameter {
  name: JointParameterName;
  /** Energy that it belongs to; null for what the scans share. */
  energyKeV: number | null;
  value: number;
  /** From the covariance; for a rate at zero, as if it could go below. null where there is none. */
  sigma: number | null;
  held: boolean;
  atBound: 'lower' | 'upper' | null;
  /** Profile-likelihood intervals; null when they were not asked for. One side is null where χ² never rises far enough. */
  interval68: Interval | null;
  interval95: Interval | null;
}

export interface JointResidual {
  energyKeV: number;
  temperatureK: number;
  observed: number;
  sigma: number;
  predicted: number;
  /** (observed − predicted)/σ */
  reduced: number;
  enabled: boolean;
}

export interface JointFitAnswer {
  status: FitStatus;
  method: RateMethod;
  parameters: readonly JointParameter[];
  /** Over parameters[indices]. */
  covariance: JointCovariance;
  chiSquare: number;
  degreesOfFreedom: number;
  pValue: number | null;
  residuals: readonly JointResidual[];
  evidence: { starts: number; iterations: number; predictedReduction: number };
}

export type JointFitOutcome =
  { status: FitStatus; answer: JointFitAnswer } | { status: 'no-minimum'; reason: string };

export interface JointFitOptions {
  /** Which parameters get profile-likelihood intervals; only those at a bound when left out. */
  intervalsFor?: 'at bound' | 'all';
  /** 'automatic' takes the closed form where it is good to 0.1 % at every point, else the exchange matrix. */
  method?: RateMethod | 'automatic';
}
