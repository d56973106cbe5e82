import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { evaluate, fillJacobian, foldAt, objectiveAt, predictFromFold } from './evaluate';
import type { Problem } from './model';
import { fillNormalEquations, solveStep } from './normal-equations';
import { findActive, type RefineScratch } from './refine';

export interface PolishResult {
  chiSquare: number;
  iterations: number;
  predictedReduction: number;
  converged: boolean;
}

/** Iterations of the library between two looks at the gradient: it has no test of its own that stops on noisy data. */
const BLOCK = 3;
const MOST_BLOCKS = 20;

/**
 * Levenberg-Marquardt in all free parameters at once by ml-levenberg-marquardt, made to hold up: data whitened (weights 1,
 * one row per prior), parameters scaled by the diagonal of the normal matrix (its damping is λ·I), analytic Jacobian, held
 * parameters and those pressed against a bound left out (it only clips), and stopped by what the undamped step promises
 * (≤ tolerance·(1 + Φ)) or by a block that brings nothing. θ is improved in place and never made worse.
 */
export function polish(
  problem: Problem,
  theta: Float64Array,
  scratch: RefineScratch,
  tolerance: number,
): PolishResult {
  const { model } = problem;
  const { normal, active } = scratch;
  let chiSquare = evaluate(problem, theta, model.held);
  let iterations = 0;
  let damping = 1e-3;
  for (let block = 0; ; block++) {
    fillJacobian(problem, theta);
    fillNormalEquations(problem, theta, normal);
    findActive(problem, theta, model.held, normal, active);
    const predictedReduction = solveStep(normal, active, 0, 0, 0);
    const converged = predictedReduction <= tolerance * (1 + chiSquare);
    if (converged || block === MOST_BLOCKS || damping > 1e6) {
      return { chiSquare, iterations, predictedReduction, converged };
    }
    const trial = runBlock(problem, theta, scratch, damping);
    iterations += trial.iterations;
    const next = evaluate(problem, trial.theta, model.held);
    damping = next < chiSquare ? Math.max(damping / 100, 1e-7) : damping * 100;
    if (next < chiSquare) {
      chiSquare = next;
      theta.set(trial.theta);
    } else evaluate(problem, theta, model.held);
  }
}

function runBlock(
  problem: Problem,
  theta: Float64Array,
  { normal, active }: RefineScratch,
  damping: number,
): { theta: Float64Array; iterations: number } {
  const { model } = problem;
  const moving = Array.from(model.names.keys()).filter((k) => !active[k]);
  const scale = moving.map((k) => 1 / Math.sqrt(normal.matrix[k * model.size + k]!));
  const rows = whitenedRows(problem, theta, moving, scale);
  const { parameterValues, iterations } = levenbergMarquardt({ x: rows.x, y: rows.y }, rows.model, {
    initialValues: moving.map((k, a) => theta[k]! / scale[a]!),
    minValues: moving.map((k, a) => model.lower[k]! / scale[a]!),
    maxValues: moving.map((k, a) => model.upper[k]! / scale[a]!),
    jacobianFunction: rows.jacobian,
    damping,
    maxIterations: BLOCK,
    errorTolerance: 0,
  });
  const next = Float64Array.from(theta);
  moving.forEach((k, a) => {
    next[k] = Math.min(Math.max(parameterValues[a]! * scale[a]!, model.lower[k]!), model.upper[k]!);
  });
  return { theta: next, iterations };
}

/** The whitened problem in the form that the library takes: x is a row number, rows past the points are priors. */
function whitenedRows(
  problem: Problem,
  theta: Float64Array,
  moving: readonly number[],
  scale: readonly number[],
) {
  const { model, data, work } = problem;
  const { rowCount, priorInverseSigma } = model;
  const priors = moving.filter((k) => priorInverseSigma[k]! > 0);
  const point = Float64Array.from(theta);
  const folded = new Array<number>(moving.length).fill(NaN);
  // The library asks for value, error and Jacobian of one point in turn: fold it once.
  const foldOnce = (parameters: readonly number[]): void => {
    if (parameters.every((value, a) => value === folded[a])) return;
    parameters.forEach((value, a) => {
      folded[a] = value;
      point[moving[a]!] = value * scale[a]!;
    });
    foldAt(model, work, point);
    predictFromFold(model, work, point);
    objectiveAt(model, data, work, point);
  };
  return {
    x: Array.from({ length: rowCount + priors.length }, (_, i) => i),
    y: [
      ...Array.from(data.y, (value, i) => value * data.inverseSigma[i]!),
      ...priors.map((k) => data.priorMean[k]! * priorInverseSigma[k]!),
    ],
    model: (parameters: number[]) => {
      foldOnce(parameters);
      return (i: number) => {
        if (i < rowCount) return work.predicted[i]! * data.inverseSigma[i]!;
        const k = priors[i - rowCount]!;
        return point[k]! * priorInverseSigma[k]!;
      };
    },
    jacobian: (parameters: number[]) => {
      foldOnce(parameters);
      fillJacobian(problem, point);
      return (i: number) =>
        moving.map((k, a) => {
          if (i < rowCount) return work.jacobian[k * rowCount + i]! * scale[a]!;
          return k === priors[i - rowCount] ? priorInverseSigma[k]! * scale[a]! : 0;
        });
    },
  };
}
