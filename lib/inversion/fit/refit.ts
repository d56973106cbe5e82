import type { FitAnswer, ParameterValues } from '../types';
import { dataChiSquare, fillJacobian, foldAt, meanLevel } from './evaluate';
import { minimise } from './minimise';
import type { PreparedFit } from './prepared-fit';
import { inValleyOf, localMinima, scanGrid, thetaOfNode } from './search';
import { thetaOf, valuesOf } from './theta-of';
import { openWidths } from './widths';

/** Another valley of the search is followed when its node lies less than this above the bottom found. */
const LOOK_AGAIN = 4;
/** The step left over, a few hundredths of a σ at most, is taken unseen: what remains is a thousandth. */
const OPTIONS = { maxIterations: 60, tolerance: 1e-5, takeLastStep: true };

/**
 * A prepared fit whose observations may be redrawn. The model, its search lattice and all scratch are those of the original:
 * they depend on no datum, so a refit folds only where it walks.
 */
export interface Refit {
  /** The same fit with observations and prior means of its own; `input.points` still holds the original values. */
  readonly prepared: PreparedFit;
  /** Scratch: Φ at the nodes of the lattice, and a second θ. */
  readonly nodes: Float64Array;
  readonly other: Float64Array;
}

export function createRefit(original: PreparedFit): Refit {
  const { problem } = original;
  const data = {
    target: Float64Array.from(problem.data.target),
    priorMean: Float64Array.from(problem.data.priorMean),
  };
  return {
    prepared: { ...original, problem: { ...problem, data } },
    nodes: new Float64Array(problem.model.grid.nodeCount),
    other: new Float64Array(problem.model.size),
  };
}

/** W·ŷ of every row of the model (points in ascending energy) at given values, in an array of its own. */
export function expectedRows(prepared: PreparedFit, values: ParameterValues): Float64Array {
  const { model, data, work } = prepared.problem;
  const theta = thetaOf(prepared, values);
  foldAt(model, work, theta);
  dataChiSquare(model, data, work, theta);
  return data.target.map((value, i) => value - work.residual[i]!);
}

/** Takes new observations W·y, one per row of the model, and the means that the priors have with them. */
export function observe(
  { prepared }: Refit,
  rows: ArrayLike<number>,
  priorMean: ArrayLike<number>,
): void {
  const { problem } = prepared;
  problem.data.target.set(rows);
  problem.data.priorMean.set(priorMean);
  problem.fallback = meanLevel(problem.model, problem.data);
}

/**
 * Where the minimum moves to first order when the observations and prior means change: θ̂ + (J̃ᵀJ̃ + P)⁻¹(J̃ᵀ·Δ(W·y) + P·Δm) over the
 * free parameters inside their bounds, J̃ = W·∂ŷ/∂θ and P the priors. A start that needs no fold.
 *
 * @returns a function that writes θ; null where the covariance does not exist.
 */
export function linearStart(
  { prepared }: Refit,
  { covariance, ...answer }: FitAnswer,
): ((rows: ArrayLike<number>, priorMean: ArrayLike<number>, theta: Float64Array) => void) | null {
  if (!covariance.ok) return null;
  const { model, work } = prepared.problem;
  const home = thetaOf(prepared, valuesOf(answer));
  const expected = expectedRows(prepared, valuesOf(answer));
  fillJacobian(prepared.problem, home);
  const inside = covariance.names.map((name) => model.names.indexOf(name));
  const { rowCount, size, priorInverseSigma, lower, upper } = model;
  const gain = new Float64Array(size * (rowCount + size));
  inside.forEach((k, a) =>
    inside.forEach((l, b) => {
      const entry = covariance.matrix[a]![b]!;
      const at = k * (rowCount + size);
      for (let i = 0; i < rowCount; i++)
        gain[at + i] = gain[at + i]! + entry * work.jacobian[l * rowCount + i]!;
      gain[at + rowCount + l] = entry * priorInverseSigma[l]! ** 2;
    }),
  );
  return (rows, priorMean, theta) => {
    for (let k = 0; k < size; k++) {
      const at = k * (rowCount + size);
      let value = home[k]!;
      for (let i = 0; i < rowCount; i++) value += gain[at + i]! * (rows[i]! - expected[i]!);
      for (let l = 0; l < size; l++) {
        if (priorInverseSigma[l]! > 0)
          value += gain[at + rowCount + l]! * (priorMean[l]! - home[l]!);
      }
      theta[k] = Math.min(Math.max(value, lower[k]!), upper[k]!);
    }
  };
}

/**
 * Global minimum of Φ for the observations taken last: from θ as handed in, and from the best two valleys of the whole
 * lattice where they may lie lower. θ is improved in place.
 *
 * @returns Φ at the minimum.
 */
export function refit(
  { prepared: { problem, scratch }, nodes, other }: Refit,
  theta: Float64Array,
): number {
  const { model } = problem;
  openWidths(model, theta, model.held);
  let { chiSquare } = minimise(problem, theta, model.held, scratch, OPTIONS);
  scanGrid(problem, model.neutral, model.held, nodes);
  for (const node of localMinima(model.grid.axes, nodes).slice(0, 2)) {
    if (nodes[node]! > chiSquare + LOOK_AGAIN) break;
    if (nodes[node]! >= chiSquare && inValleyOf(model, node, theta)) continue;
    thetaOfNode(model, node, model.neutral, other);
    openWidths(model, other, model.held);
    const next = minimise(problem, other, model.held, scratch, OPTIONS).chiSquare;
    if (next >= chiSquare) continue;
    chiSquare = next;
    theta.set(other);
  }
  return chiSquare;
}
