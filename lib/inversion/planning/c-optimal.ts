import { CholeskyDecomposition, Matrix } from 'ml-matrix';

/** Variance of one parameter when time is added at some candidates. */
export interface DesignProblem {
  /** Present covariance C = M₀⁻¹, positive definite. */
  covariance: readonly (readonly number[])[];
  /** Which parameter: c is a unit vector. */
  index: number;
  /** a_k: one hour at candidate k adds a_k·a_kᵀ to the information. */
  vectors: readonly Float64Array[];
}

/**
 * The same in coordinates where the present information is the unit matrix: C = LLᵀ, b = Lᵀa, ℓ = Lᵀc; then the variance is
 * ℓᵀ(1 + Σ t_k b_k b_kᵀ)⁻¹ℓ, well-conditioned whatever the units, and C is never inverted.
 */
export interface WhitenedDesign {
  size: number;
  ell: Float64Array;
  b: readonly Float64Array[];
}

export function whitenDesign({ covariance, index, vectors }: DesignProblem): WhitenedDesign {
  const size = covariance.length;
  const sigma = covariance.map((row, k) => Math.sqrt(row[k]!));
  const correlation = new Matrix(
    covariance.map((row, k) => row.map((value, l) => value / (sigma[k]! * sigma[l]!))),
  );
  const factor = new CholeskyDecomposition(correlation).lowerTriangularMatrix;
  const transposed = (vector: ArrayLike<number>): Float64Array =>
    Float64Array.from({ length: size }, (_, column) => {
      let sum = 0;
      for (let k = column; k < size; k++) sum += factor.get(k, column) * sigma[k]! * vector[k]!;
      return sum;
    });
  return {
    size,
    ell: transposed(Float64Array.from({ length: size }, (_, k) => (k === index ? 1 : 0))),
    b: vectors.map(transposed),
  };
}

/** N = 1 + Σ t_k b_k b_kᵀ, solved for ℓ and the candidates. */
export interface DesignState {
  variance: number;
  /** d_k = (b_kᵀN⁻¹ℓ)² = −∂variance/∂t_k. */
  slopes: Float64Array;
  cholesky: CholeskyDecomposition;
  /** b_kᵀN⁻¹ℓ. */
  projections: Float64Array;
}

export function designState({ size, ell, b }: WhitenedDesign, hours: Float64Array): DesignState {
  const information = Matrix.eye(size);
  b.forEach((vector, k) => {
    const t = hours[k]!;
    if (!(t > 0)) return;
    for (let i = 0; i < size; i++)
      for (let j = 0; j < size; j++)
        information.set(i, j, information.get(i, j) + t * (vector[i]! * vector[j]!));
  });
  const cholesky = new CholeskyDecomposition(information);
  const u = cholesky.solve(Matrix.columnVector([...ell])).to1DArray();
  const projections = Float64Array.from(b, (vector) => dot(vector, u));
  return {
    variance: dot(ell, u),
    slopes: projections.map((value) => value * value),
    cholesky,
    projections,
  };
}

export interface OptimalDesign {
  /** t_k ≥ 0 with Σ t_k = H. */
  hours: Float64Array;
  variance: number;
  /** No split of the same hours has a variance lower than this one's by more than the gap. */
  gap: number;
  exchanges: number;
}

/** The split is done when no other can be better by more than this share of the variance. */
const RELATIVE_GAP = 1e-9;
const MOST_EXCHANGES = 5_000;
/** Slopes that differ by less than this share of themselves are equal. */
const ROUNDING = 1e-13;

/**
 * c-optimal split of H hours: minimises cᵀ(M₀ + Σ t_k a_k a_kᵀ)⁻¹c over t ≥ 0, Σ t_k = H, which is convex in t.
 *
 * Vertex exchange (V. V. Fedorov, Theory of Optimal Experiments, 1972; D. Böhning, Metrika 33, 337, 1986): time goes from the
 * candidate in use with the flattest slope to the one with the steepest, as much as lowers the variance most, which has a closed
 * form. By the equivalence theorem the split is optimal where every candidate in use has the steepest slope; by convexity
 * H·max d − Σ t_k d_k bounds what any other split could still gain, and it is the stopping rule. With the priors and points of a
 * scan some hundred exchanges do; where the hours drown them (a thousand and more, among hundreds of energies) the gap that is left
 * after 5,000 is given as it is.
 */
export function optimalDesign(problem: DesignProblem, hours: number): OptimalDesign {
  const design = whitenDesign(problem);
  const split = new Float64Array(design.b.length).fill(hours / design.b.length);
  let state = designState(design, split);
  let exchanges = 0;
  for (; exchanges < MOST_EXCHANGES; exchanges++) {
    const { variance, slopes } = state;
    if (gapOf(split, slopes, hours) <= RELATIVE_GAP * variance) break;
    const to = indexOfLargest(slopes, () => true, 1);
    const from = indexOfLargest(slopes, (k) => split[k]! > 0 && k !== to, -1);
    if (from < 0) break;
    const moved = bestExchange(design, state, from, to, split[from]!);
    if (!(moved > 0)) break;
    split[to] = split[to]! + moved;
    split[from] = moved === split[from]! ? 0 : split[from]! - moved;
    state = designState(design, split);
  }
  return {
    hours: split,
    variance: state.variance,
    gap: Math.max(0, gapOf(split, state.slopes, hours)),
    exchanges,
  };
}

function gapOf(split: Float64Array, slopes: Float64Array, hours: number): number {
  let steepest = 0;
  let used = 0;
  for (let k = 0; k < split.length; k++) {
    steepest = Math.max(steepest, slopes[k]!);
    used += split[k]! * slopes[k]!;
  }
  return hours * steepest - used;
}

function indexOfLargest(
  values: Float64Array,
  allowed: (k: number) => boolean,
  sign: 1 | -1,
): number {
  let best = -1;
  for (let k = 0; k < values.length; k++)
    if (allowed(k) && (best < 0 || sign * values[k]! > sign * values[best]!)) best = k;
  return best;
}

/**
 * δ that minimises the variance along N + δ(b_to b_toᵀ − b_from b_fromᵀ), 0 ≤ δ ≤ most. With A, B, C the products of the two
 * through N⁻¹ and p, q their projections, the slopes of the two are equal in size at δ = (p ± q)/(Bp ∓ Aq + C(±p − q)); the
 * variance is convex along the line, so the smallest positive root is its minimum.
 */
function bestExchange(
  { b }: WhitenedDesign,
  { cholesky, projections }: DesignState,
  from: number,
  to: number,
  most: number,
): number {
  const p = projections[to]!;
  const q = projections[from]!;
  // Equal but for rounding: the root of the minimum is 0 and must not be taken for the other one.
  if (!(p * p - q * q > ROUNDING * p * p)) return 0;
  const [bTo, bFrom] = [b[to]!, b[from]!];
  const solve = (vector: Float64Array): number[] =>
    cholesky.solve(Matrix.columnVector([...vector])).to1DArray();
  const solvedTo = solve(bTo);
  const solvedFrom = solve(bFrom);
  const a = dot(bTo, solvedTo);
  const bb = dot(bFrom, solvedFrom);
  const c = dot(bTo, solvedFrom);
  const roots = [
    (p + q) / (bb * p - a * q + c * (p - q)),
    (p - q) / (bb * p + a * q - c * (p + q)),
  ].filter((root) => root > 0);
  return Math.min(most, ...roots);
}

function dot(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let k = 0; k < a.length; k++) sum += a[k]! * b[k]!;
  return sum;
}
