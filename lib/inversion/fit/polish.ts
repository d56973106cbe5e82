import { evaluate, fillJacobian, foldAt } from './evaluate';
import { leastSquares, type LeastSquaresResult } from './least-squares';
import type { LeastSquaresProblem } from './least-squares-problem';
import type { Problem } from './model';

const MOST_ROUNDS = 20;

/**
 * Polish in all free parameters at once, levels included, by the general least-squares solver: θ is improved in place and
 * never made worse. Priors are rows of their own.
 */
export function polish(
  problem: Problem,
  theta: Float64Array,
  tolerance: number,
): LeastSquaresResult {
  const { model } = problem;
  const free = Array.from(model.names.keys()).filter((k) => !model.held[k]);
  evaluate(problem, theta, model.held);
  const point = Float64Array.from(free, (k) => theta[k]!);
  const result = leastSquares(whitened(problem, theta, free), point, {
    tolerance,
    floor: 1,
    mostRounds: MOST_ROUNDS,
  });
  free.forEach((k, a) => {
    theta[k] = point[a]!;
  });
  return result;
}

/** The fit as whitened rows: one per point (0 where switched off), then one per prior. */
function whitened(
  problem: Problem,
  theta: Float64Array,
  free: readonly number[],
): LeastSquaresProblem {
  const { model, data, work } = problem;
  const { rowCount, shapeCount, levelCount, priorInverseSigma } = model;
  const priors = free.filter((k) => priorInverseSigma[k]! > 0);
  const rows = rowCount + priors.length;
  const full = Float64Array.from(theta);
  // Value and Jacobian of one point are asked for in turn: it is folded once.
  let folded = false;
  const foldPoint = (values: ArrayLike<number>): void => {
    for (let a = 0; a < free.length; a++) {
      if (full[free[a]!] === values[a]!) continue;
      full[free[a]!] = values[a]!;
      folded = false;
    }
    if (!folded) foldAt(model, work, full);
    folded = true;
  };
  return {
    size: free.length,
    rows,
    target: [...data.target, ...priors.map((k) => data.priorMean[k]! * priorInverseSigma[k]!)],
    lower: free.map((k) => model.lower[k]!),
    upper: free.map((k) => model.upper[k]!),
    predict(values, into) {
      foldPoint(values);
      for (let i = 0; i < rowCount; i++) {
        let value = 0;
        for (let l = 0; l < levelCount; l++)
          value += full[shapeCount + l]! * work.columns[l * rowCount + i]!;
        into[i] = value;
      }
      priors.forEach((k, p) => {
        into[rowCount + p] = full[k]! * priorInverseSigma[k]!;
      });
    },
    jacobian(values, into) {
      foldPoint(values);
      fillJacobian(problem, full);
      free.forEach((k, a) => {
        into.set(work.jacobian.subarray(k * rowCount, (k + 1) * rowCount), a * rows);
        priors.forEach((l, p) => {
          into[a * rows + rowCount + p] = l === k ? priorInverseSigma[k]! : 0;
        });
      });
    },
  };
}
