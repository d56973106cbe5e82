import type { Problem } from './model';

/** M = JᵀJ + priors and b = −½∂Φ/∂θ of all parameters, with scratch for one damped solve. */
export interface NormalEquations {
  size: number;
  matrix: Float64Array;
  /** b: the downhill direction, half the negative gradient of Φ. */
  gradient: Float64Array;
  step: Float64Array;
  factor: Float64Array;
  index: Int32Array;
}

export function createNormalEquations(size: number): NormalEquations {
  return {
    size,
    matrix: new Float64Array(size * size),
    gradient: new Float64Array(size),
    step: new Float64Array(size),
    factor: new Float64Array(size * size),
    index: new Int32Array(size),
  };
}

export function fillNormalEquations(
  { model, data, work }: Problem,
  theta: Float64Array,
  normal: NormalEquations,
): void {
  const { size, rowCount, priorInverseSigma } = model;
  const { jacobian, residual } = work;
  const { matrix, gradient } = normal;
  for (let k = 0; k < size; k++) {
    const kAt = k * rowCount;
    let b = 0;
    for (let i = 0; i < rowCount; i++) b += jacobian[kAt + i]! * residual[i]!;
    const weight = priorInverseSigma[k]! * priorInverseSigma[k]!;
    gradient[k] = weight > 0 ? b + weight * (data.priorMean[k]! - theta[k]!) : b;
    for (let l = 0; l <= k; l++) {
      const lAt = l * rowCount;
      let sum = k === l ? weight : 0;
      for (let i = 0; i < rowCount; i++) sum += jacobian[kAt + i]! * jacobian[lAt + i]!;
      matrix[k * size + l] = matrix[l * size + k] = sum;
    }
  }
}

/** A pivot below this share of its diagonal leaves the parameter where it is. */
const SINGULAR = 1e-13;

/**
 * Solves (M + damping·diag M over the nonlinear parameters) step = b over the parameters that are not active, by
 * Cholesky. Levels (levelsFrom ≤ k < levelsTo) are not damped: they are linear.
 *
 * @returns the decrease of Φ that the quadratic model promises for the step.
 */
export function solveStep(
  normal: NormalEquations,
  active: Uint8Array,
  damping: number,
  levelsFrom: number,
  levelsTo: number,
): number {
  const { size, matrix, gradient, step, factor, index } = normal;
  let m = 0;
  for (let k = 0; k < size; k++) {
    step[k] = 0;
    if (!active[k]) index[m++] = k;
  }
  for (let a = 0; a < m; a++) {
    const k = index[a]!;
    const diagonal = matrix[k * size + k]!;
    const damped = k >= levelsFrom && k < levelsTo ? diagonal : diagonal * (1 + damping);
    for (let b = 0; b <= a; b++) {
      let sum = a === b ? damped : matrix[k * size + index[b]!]!;
      for (let c = 0; c < b; c++) sum -= factor[a * size + c]! * factor[b * size + c]!;
      if (a === b) factor[a * size + a] = sum > SINGULAR * diagonal ? Math.sqrt(sum) : 0;
      else factor[a * size + b] = factor[b * size + b]! > 0 ? sum / factor[b * size + b]! : 0;
    }
  }
  for (let a = 0; a < m; a++) {
    let sum = gradient[index[a]!]!;
    for (let c = 0; c < a; c++) sum -= factor[a * size + c]! * step[index[c]!]!;
    step[index[a]!] = factor[a * size + a]! > 0 ? sum / factor[a * size + a]! : 0;
  }
  for (let a = m - 1; a >= 0; a--) {
    let sum = step[index[a]!]!;
    for (let c = a + 1; c < m; c++) sum -= factor[c * size + a]! * step[index[c]!]!;
    step[index[a]!] = factor[a * size + a]! > 0 ? sum / factor[a * size + a]! : 0;
  }
  let promised = 0;
  for (let a = 0; a < m; a++) {
    const k = index[a]!;
    const extra = k >= levelsFrom && k < levelsTo ? 0 : damping * matrix[k * size + k]! * step[k]!;
    promised += step[k]! * (gradient[k]! + extra);
  }
  return promised;
}
