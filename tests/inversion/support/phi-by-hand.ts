import {
  foldScan,
  type FitInput,
  type ParameterName,
  type PreparedFit,
} from '@/lib/inversion/index';
import { solveInBox } from './solve-in-box';

export const LEVELS: readonly ParameterName[] = ['levelTop', 'levelBulk', 'levelCap'];

/** Populated share of every point: what a scan with levels 0 in front, 1 in the bulk and 0 in the cap would be. */
export function shareAt(
  prepared: PreparedFit,
  names: readonly ParameterName[],
  x: readonly number[],
): Float64Array {
  const values = Object.fromEntries(names.map((name, k) => [name, x[k]!]));
  return foldScan(prepared, { ...values, levelTop: 0, levelBulk: 1, levelCap: 0 });
}

/**
 * Φ at a shape and depth scale with the levels at their best within their bounds: (y − ŷ)ᵀV⁻¹(y − ŷ) and the priors. The share of
 * every point may be handed in where it is known.
 */
export function phiOf(
  prepared: PreparedFit,
  names: readonly ParameterName[],
): (x: readonly number[], share?: Float64Array) => number {
  const { input, problem } = prepared;
  const { model } = problem;
  const used = input.points.map((_, i) => i).filter((i) => input.points[i]!.enabled);
  const weights = inverseOf(used.map((i) => used.map((j) => varianceOf(input, i, j))));
  const levels = LEVELS.filter((name) => model.names.includes(name));
  const at = levels.map((name) => model.names.indexOf(name));
  const prior = (name: ParameterName): { mean: number; weight: number } | null => {
    const setting = input.parameters[name];
    if (!setting || setting.held) return null;
    const { mean, sigma } =
      setting.prior ?? (name === 'depthScale' ? { mean: 1, sigma: 0.03 } : {});
    return mean === undefined || sigma === undefined ? null : { mean, weight: 1 / sigma ** 2 };
  };
  const levelPriors = levels.map(prior);
  const shapePriors = names.map(prior);
  const scaleAt = names.indexOf('depthScale');
  let cap: { scale: number; share: Float64Array } = {
    scale: NaN,
    share: new Float64Array(input.points.length),
  };
  const box = {
    lower: at.map((k) => model.lower[k]!),
    upper: at.map((k) => model.upper[k]!),
    held: at.map((k) => (model.held[k] ? model.neutral[k]! : null)),
  };
  const y = used.map((i) => input.points[i]!.value);
  const n = used.length;
  const size = levels.length;
  const columns = Array.from({ length: size }, () => new Float64Array(n));
  const weighted = Array.from({ length: size }, () => new Float64Array(n));
  const residual = new Float64Array(n);
  return (x, share = shareAt(prepared, names, x)) => {
    if (size > 2 && cap.scale !== x[scaleAt]) {
      const values = Object.fromEntries(names.map((name, k) => [name, x[k]!]));
      const capOnly = { ...values, levelTop: 0, levelBulk: 0, levelCap: 1 };
      cap = { scale: x[scaleAt]!, share: foldScan(prepared, capOnly) };
    }
    used.forEach((point, i) => {
      columns[1]![i] = share[point]!;
      if (size > 2) columns[2]![i] = cap.share[point]!;
      columns[0]![i] = 1 - share[point]! - cap.share[point]!;
    });
    for (let k = 0; k < size; k++) multiply(weights, columns[k]!, weighted[k]!);
    const gram = columns.map((a, k) =>
      weighted.map((b, l) => dot(a, b) + (k === l ? (levelPriors[k]?.weight ?? 0) : 0)),
    );
    const right = weighted.map(
      (b, k) => dot(b, y) + (levelPriors[k] ? levelPriors[k].weight * levelPriors[k].mean : 0),
    );
    const level = solveInBox(gram, right, box);
    for (let i = 0; i < n; i++) {
      residual[i] = y[i]!;
      for (let k = 0; k < size; k++) residual[i]! -= level[k]! * columns[k]![i]!;
    }
    let sum = 0;
    for (let i = 0; i < n; i++) sum += residual[i]! * dot(weights[i]!, residual);
    levelPriors.forEach((p, k) => {
      if (p) sum += p.weight * (level[k]! - p.mean) ** 2;
    });
    shapePriors.forEach((p, k) => {
      if (p) sum += p.weight * (x[k]! - p.mean) ** 2;
    });
    return sum;
  };
}

function varianceOf({ points, covariance }: FitInput, i: number, j: number): number {
  if (covariance) return covariance[i]![j]!;
  return i === j ? points[i]!.sigma ** 2 : 0;
}

/** V⁻¹ by Gauss-Jordan elimination. */
function inverseOf(matrix: number[][]): Float64Array[] {
  const n = matrix.length;
  const work = matrix.map((row, i) => [...row, ...row.map((_, j) => (i === j ? 1 : 0))]);
  for (let k = 0; k < n; k++) {
    const pivot = work[k]![k]!;
    for (let j = 0; j < 2 * n; j++) work[k]![j]! /= pivot;
    for (let i = 0; i < n; i++) {
      const factor = work[i]![k]!;
      if (i === k || factor === 0) continue;
      for (let j = 0; j < 2 * n; j++) work[i]![j]! -= factor * work[k]![j]!;
    }
  }
  return work.map((row) => Float64Array.from(row.slice(n)));
}

function dot(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}

function multiply(matrix: Float64Array[], x: Float64Array, into: Float64Array): void {
  for (let i = 0; i < matrix.length; i++) into[i] = dot(matrix[i]!, x);
}
