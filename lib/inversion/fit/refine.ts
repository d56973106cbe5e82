import { evaluate, fillJacobian } from './evaluate';
import type { Problem } from './model';
import {
  createNormalEquations,
  fillNormalEquations,
  solveStep,
  type NormalEquations,
} from './normal-equations';

export interface RefineResult {
  chiSquare: number;
  iterations: number;
  /** Decrease of Φ that the undamped step still promises. */
  predictedReduction: number;
  converged: boolean;
}

export interface RefineOptions {
  maxIterations: number;
  /** Converged when the undamped step promises less than this times 1 + Φ. */
  tolerance: number;
  /**
   * Takes the last step, whose promise ended the search, unseen: θ and Φ are then right to the next order, but the workspace
   * still holds the fold before it.
   */
  takeLastStep?: boolean;
}

export interface RefineScratch {
  normal: NormalEquations;
  trial: Float64Array;
  active: Uint8Array;
}

export function createRefineScratch(size: number): RefineScratch {
  return {
    normal: createNormalEquations(size),
    trial: new Float64Array(size),
    active: new Uint8Array(size),
  };
}

const FIRST_DAMPING = 1e-4;
const LARGEST_DAMPING = 1e9;
/** Widths below this share of their range, a fraction of a bin, may be taken to zero in one step. */
const SMALLEST_SHARE = 0.002;

/**
 * Levenberg-Marquardt on the shape and the depth scale with the levels re-solved exactly after every step (variable
 * projection): the step is that of the full normal equations, damped on the nonlinear parameters only, clipped to the
 * box; a parameter at its bound with the gradient pointing outward sits the step out. θ is improved in place.
 *
 * Converged when the undamped step promises less than tolerance·(1 + Φ).
 */
export function refine(
  problem: Problem,
  theta: Float64Array,
  held: Uint8Array,
  scratch: RefineScratch,
  options: RefineOptions,
): RefineResult {
  const { normal, trial, active } = scratch;
  const { shapeCount, levelCount } = problem.model;
  let chiSquare = evaluate(problem, theta, held);
  let damping = FIRST_DAMPING;
  let iterations = 0;
  let predictedReduction = Infinity;
  let fresh = true;
  while (iterations < options.maxIterations) {
    if (fresh) {
      fillJacobian(problem, theta);
      fillNormalEquations(problem, theta, normal);
      findActive(problem, theta, held, normal, active);
      fresh = false;
    }
    iterations++;
    predictedReduction = solveStep(normal, active, damping, shapeCount, shapeCount + levelCount);
    if (predictedReduction <= options.tolerance * (1 + chiSquare)) {
      if (damping > FIRST_DAMPING)
        predictedReduction = solveStep(normal, active, 0, shapeCount, shapeCount + levelCount);
      if (predictedReduction <= options.tolerance * (1 + chiSquare)) {
        if (options.takeLastStep) {
          stepFrom(problem, theta, active, normal.step, trial);
          theta.set(trial);
          chiSquare -= predictedReduction;
        }
        return { chiSquare, iterations, predictedReduction, converged: true };
      }
    }
    stepFrom(problem, theta, active, normal.step, trial);
    const next = evaluate(problem, trial, held);
    if (next < chiSquare) {
      const gain = (chiSquare - next) / predictedReduction;
      damping = gain > 0.75 ? damping / 10 : gain < 0.25 ? damping * 3 : damping;
      chiSquare = next;
      theta.set(trial);
      fresh = true;
    } else {
      damping = Math.max(damping, 1e-6) * 10;
      if (damping > LARGEST_DAMPING) break;
    }
  }
  // The fold in the workspace may belong to a refused step.
  evaluate(problem, theta, held);
  return { chiSquare, iterations, predictedReduction, converged: false };
}

/** θ + step within the bounds, into trial. */
function stepFrom(
  { model }: Problem,
  theta: Float64Array,
  active: Uint8Array,
  step: Float64Array,
  trial: Float64Array,
): void {
  const { size, lower, upper } = model;
  for (let k = 0; k < size; k++) {
    trial[k] = active[k]
      ? theta[k]!
      : Math.min(Math.max(theta[k]! + step[k]!, lower[k]!), upper[k]!);
  }
  for (const k of model.widths) {
    // Φ is even in a width: a step past zero says little of where the minimum is, so it stops short of it.
    if (trial[k] === 0 && theta[k]! > SMALLEST_SHARE * upper[k]!) trial[k] = theta[k]! / 5;
  }
}

/** Marks what may not move: held parameters, and those at a bound whose gradient points outward. */
function findActive(
  problem: Problem,
  theta: Float64Array,
  held: Uint8Array,
  normal: NormalEquations,
  active: Uint8Array,
): void {
  const { size, lower, upper } = problem.model;
  for (let k = 0; k < size; k++) {
    const downhill = normal.gradient[k]!;
    const blocked =
      (theta[k]! <= lower[k]! && downhill <= 0) || (theta[k]! >= upper[k]! && downhill >= 0);
    active[k] = held[k] || blocked || !(normal.matrix[k * size + k]! > 0) ? 1 : 0;
  }
}
