/** A least-squares problem in whitened form: every row has σ = 1, priors are rows like any other. */
export interface LeastSquaresProblem {
  size: number;
  rows: number;
  target: ArrayLike<number>;
  lower: ArrayLike<number>;
  upper: ArrayLike<number>;
  /** Model value of every row at θ. */
  predict(theta: ArrayLike<number>, into: Float64Array): void;
  /** ∂(row i)/∂θ_k at into[k·rows + i]. */
  jacobian(theta: ArrayLike<number>, into: Float64Array): void;
}

/** Scratch of one solve. */
export interface State {
  jacobian: Float64Array;
  residual: Float64Array;
  predicted: Float64Array;
  /** Largest column norm of each parameter so far. */
  norms: Float64Array;
}

/** Parameters that may move, with the scale that gives their column norm one. */
export interface Moving {
  index: number[];
  scale: number[];
}

export interface Trial {
  theta: Float64Array;
  chiSquare: number;
  iterations: number;
  damping: number;
}

/** χ² at θ, the residuals written out; a model that is not finite there counts as infinitely bad. */
export function chiSquareAt(
  problem: LeastSquaresProblem,
  theta: ArrayLike<number>,
  residual: Float64Array,
): number {
  problem.predict(theta, residual);
  let sum = 0;
  for (let i = 0; i < problem.rows; i++) {
    residual[i] = problem.target[i]! - residual[i]!;
    sum += residual[i]! * residual[i]!;
  }
  return Number.isFinite(sum) ? sum : Infinity;
}
