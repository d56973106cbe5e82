import type { ShareFold, TrialProfile } from '../profile/trial-profile';
import type { Kernel } from '../fold/kernel';
import type { ParameterName } from '../types';

/**
 * A fit input compiled to flat numbers. Parameters are one vector θ: first the shape of the trial profile, then the
 * levels (top, bulk, cap where there is one), last the depth scale. Rows are the points in ascending energy.
 *
 * ŷ_i = top·(1 − q_i − S_i) + bulk·S_i + cap·q_i, S_i the populated share and q_i the share stopped in the cap.
 */
export interface Model {
  rowCount: number;
  /** Row of the model → point of the scan. */
  pointOfRow: Int32Array;
  kernel: Kernel;
  trial: TrialProfile;
  capNm: number;
  names: readonly ParameterName[];
  size: number;
  shapeCount: number;
  levelCount: number;
  /** Index of the depth scale, which is the last. */
  scaleIndex: number;
  lower: Float64Array;
  upper: Float64Array;
  /** 1 where a bound is the natural end of the parameter and not merely the end of the search. */
  closedLower: Uint8Array;
  closedUpper: Uint8Array;
  held: Uint8Array;
  /** Held values; where free, a neutral value (prior mean, 1 for the scale, 0 otherwise). */
  neutral: Float64Array;
  /** 1/σ of each prior; 0 for none. */
  priorInverseSigma: Float64Array;
  grid: SearchGrid;
}

/** What a resample changes and nothing else: values, 1/σ (0 for a point left out) and the means of the priors. */
export interface Data {
  y: Float64Array;
  inverseSigma: Float64Array;
  priorMean: Float64Array;
}

/** Folds of the search nodes at the neutral depth scale: they depend on no datum, so every resample shares them. */
export interface SearchGrid {
  nodeCount: number;
  shapes: Float64Array;
  shares: Float64Array;
  capShares: Float64Array;
  /** Nodes per line of the lattice, slowest first; [n] for a sharp edge, [widths, depths] for a graded one. */
  lattice: readonly [number, number];
}

/** Scratch of one thread: allocated once, written by every evaluation. */
export interface Workspace {
  fold: ShareFold;
  capShare: Float64Array;
  capByStart: Float64Array;
  predicted: Float64Array;
  /** (y − ŷ)/σ */
  residual: Float64Array;
  /** Whitened Jacobian ∂ŷ/∂θ_k /σ, parameter-major: jacobian[k·rows + i]. */
  jacobian: Float64Array;
  gram: Float64Array;
  moment: Float64Array;
  levels: Float64Array;
  heldLevel: Uint8Array;
}

/** One minimisation: a model, its data, the scratch it may write, and the level that an undetermined level falls back to. */
export interface Problem {
  model: Model;
  data: Data;
  work: Workspace;
  fallback: number;
}
