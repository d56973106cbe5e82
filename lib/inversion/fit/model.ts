import type { TrialProfile } from '../profile/trial-profile';
import type { ShareFold } from '../fold/share-fold';
import type { Kernel } from '../fold/kernel';
import type { Whitener } from '../linalg/whitener';
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
  /** Which shape parameters are widths: zero makes a step. */
  widths: readonly number[];
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
  /** W with WᵀW = V⁻¹: everything that Φ is made of is folded first and whitened then. */
  whitener: Whitener;
  /** W·1: what a scan of ones becomes. */
  unit: Float64Array;
  grid: SearchGrid;
}

/** What a resample changes and nothing else: the whitened values W·y and the means of the priors. */
export interface Data {
  target: Float64Array;
  priorMean: Float64Array;
}

/**
 * Whitened folds of the search nodes at the neutral depth scale and the normal matrices of their levels: they depend on no
 * datum, so every resample shares them. The nodes are all combinations of the axes, the first parameter changing fastest.
 */
export interface SearchGrid {
  nodeCount: number;
  /** Values tried of each shape parameter, ascending. */
  axes: readonly Float64Array[];
  /** W·S, row-major by node. */
  shares: Float64Array;
  /** W·q. */
  capShare: Float64Array;
  /** Normal matrix of the levels with their priors, levels² numbers by node. */
  grams: Float64Array;
}

/** Scratch of one thread: allocated once, written by every evaluation. */
export interface Workspace {
  fold: ShareFold;
  capShare: Float64Array;
  capByStart: Float64Array;
  /** W times the columns of the levels, 1 − q − S, S and q: level-major, columns[l·rows + i]. */
  columns: Float64Array;
  /** ŷ, not whitened. */
  predicted: Float64Array;
  /** W·(y − ŷ) */
  residual: Float64Array;
  /** Whitened Jacobian W·∂ŷ/∂θ_k, parameter-major: jacobian[k·rows + i]. */
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
