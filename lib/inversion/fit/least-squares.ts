import { Matrix, QrDecomposition } from 'ml-matrix';
import {
  chiSquareAt,
  type LeastSquaresProblem,
  type Moving,
  type State,
  type Trial,
} from './least-squares-problem';
import { BLOCK, runLibraryBlock } from './library-block';

export interface LeastSquaresResult {
  chiSquare: number;
  iterations: number;
  /** Decrease that the undamped step still promises. */
  predictedReduction: number;
  converged: boolean;
  /** Steps that the library could not make and the orthogonal solver did. */
  rescued: number;
}

export interface LeastSquaresOptions {
  /** Converged when the undamped step promises less than this times χ² + floor. */
  tolerance: number;
  floor: number;
  mostRounds: number;
}

const FIRST_DAMPING = 1e-3;
const LARGEST_DAMPING = 1e12;
/** What a step promises, relative to χ², below which χ² itself is too coarse to judge it. */
const NEAR = 1e-9;
/** Near the minimum a step squares what is left: one iteration of the library, and a look whether that was so. */
const ONE_IS_ENOUGH = 1e-3;

/**
 * Levenberg-Marquardt by ml-levenberg-marquardt, made to hold up: data whitened (weights 1), parameters scaled by the column
 * norms of the Jacobian (its damping is λ·I), analytic Jacobian, parameters pressed against a bound left out (it only clips),
 * stopped by what the undamped step promises. It forms JᵀJ and keeps a step that makes things worse, so where a block of it
 * brings less than half of what was promised, a damped step from the QR decomposition of the Jacobian itself follows
 * (J. J. Moré, in Numerical Analysis, Dundee 1977, Springer, p. 105), accepted only if it helps. θ is improved in place and never made
 * worse.
 */
export function leastSquares(
  problem: LeastSquaresProblem,
  theta: Float64Array,
  { tolerance, floor, mostRounds }: LeastSquaresOptions,
): LeastSquaresResult {
  const state: State = {
    jacobian: new Float64Array(problem.rows * problem.size),
    residual: new Float64Array(problem.rows),
    predicted: new Float64Array(problem.rows),
    norms: new Float64Array(problem.size),
  };
  let chiSquare = chiSquareAt(problem, theta, state.residual);
  let iterations = 0;
  let rescued = 0;
  let damping = FIRST_DAMPING;
  const take = (trial: Trial): boolean => {
    iterations += trial.iterations;
    if (!(trial.chiSquare < chiSquare)) return false;
    theta.set(trial.theta);
    chiSquare = trial.chiSquare;
    return true;
  };
  for (let round = 0; ; round++) {
    chiSquareAt(problem, theta, state.residual);
    problem.jacobian(theta, state.jacobian);
    const moving = movable(problem, theta, state);
    const { promised } = orthogonalStep(problem, state, moving, 0);
    const converged = promised <= tolerance * (chiSquare + floor);
    if (converged || round === mostRounds || damping > LARGEST_DAMPING) {
      return { chiSquare, iterations, predictedReduction: promised, converged, rescued };
    }
    if (promised <= NEAR * (chiSquare + floor)) {
      const step = gaussNewton(problem, theta, state, moving, chiSquare, promised);
      iterations++;
      if (step) {
        theta.set(step.theta);
        chiSquare = step.chiSquare;
        continue;
      }
    }
    const before = chiSquare;
    const iterationsWanted = promised < ONE_IS_ENOUGH * (chiSquare + floor) ? 1 : BLOCK;
    take(runLibraryBlock(problem, theta, state, moving, damping, iterationsWanted));
    if (before - chiSquare >= 0.5 * promised) {
      damping = Math.max(damping / 100, 1e-7);
      continue;
    }
    const better = dampedStep(problem, theta, state, chiSquare, damping);
    if (take(better)) rescued++;
    damping = better.damping;
  }
}

function movable(
  { rows, size, lower, upper }: LeastSquaresProblem,
  theta: Float64Array,
  { jacobian, residual, norms }: State,
): Moving {
  const moving: Moving = { index: [], scale: [] };
  for (let k = 0; k < size; k++) {
    let downhill = 0;
    let square = 0;
    for (let i = 0; i < rows; i++) {
      downhill += jacobian[k * rows + i]! * residual[i]!;
      square += jacobian[k * rows + i]! ** 2;
    }
    const blocked =
      (theta[k]! <= lower[k]! && downhill <= 0) || (theta[k]! >= upper[k]! && downhill >= 0);
    if (blocked || !(square > 0)) continue;
    moving.index.push(k);
    // Never smaller than once: a parameter whose column fades away would otherwise take ever longer steps.
    norms[k] = Math.max(norms[k]!, Math.sqrt(square));
    moving.scale.push(1 / norms[k]!);
  }
  return moving;
}

/** (JᵀJ + λ·diag JᵀJ) step = Jᵀr from the QR decomposition of [J; √λ·D], and the decrease of χ² that it promises. */
function orthogonalStep(
  { rows }: LeastSquaresProblem,
  { jacobian, residual }: State,
  { index, scale }: Moving,
  damping: number,
): { step: number[]; promised: number } {
  const n = index.length;
  if (n === 0) return { step: [], promised: 0 };
  const design = Matrix.zeros(rows + (damping > 0 ? n : 0), n);
  const right = Matrix.zeros(design.rows, 1);
  for (let i = 0; i < rows; i++) right.set(i, 0, residual[i]!);
  index.forEach((k, a) => {
    for (let i = 0; i < rows; i++) design.set(i, a, jacobian[k * rows + i]! * scale[a]!);
    if (damping > 0) design.set(rows + a, a, Math.sqrt(damping));
  });
  const decomposition = new QrDecomposition(design);
  if (!decomposition.isFullRank())
    return { step: new Array<number>(n).fill(0), promised: Infinity };
  const scaled = decomposition.solve(right);
  const fitted = design.mmul(scaled);
  let promised = 0;
  for (let i = 0; i < rows; i++)
    promised += fitted.get(i, 0) * (2 * residual[i]! - fitted.get(i, 0));
  return { step: scaled.to1DArray().map((value, a) => value * scale[a]!), promised };
}

/** Steps from the orthogonal solver, damped more each time, until one lowers χ². */
function dampedStep(
  problem: LeastSquaresProblem,
  theta: Float64Array,
  state: State,
  chiSquare: number,
  damping: number,
): Trial {
  chiSquareAt(problem, theta, state.residual);
  problem.jacobian(theta, state.jacobian);
  const moving = movable(problem, theta, state);
  const trial = Float64Array.from(theta);
  let current = damping;
  for (let tries = 1; current <= LARGEST_DAMPING; tries++) {
    const { step, promised } = orthogonalStep(problem, state, moving, current);
    moving.index.forEach((k, a) => {
      trial[k] = Math.min(Math.max(theta[k]! + step[a]!, problem.lower[k]!), problem.upper[k]!);
    });
    const next = chiSquareAt(problem, trial, state.predicted);
    if (next < chiSquare) {
      const quick = chiSquare - next > 0.75 * promised;
      return {
        theta: trial,
        chiSquare: next,
        iterations: tries,
        damping: quick ? Math.max(current / 10, 1e-12) : current,
      };
    }
    current *= 10;
  }
  return { theta, chiSquare, iterations: 0, damping: current };
}

/**
 * Close to the minimum χ² is flat to rounding and cannot judge a step; what the next step would promise still can. The undamped
 * step, where it leaves less than a quarter of the promise; null where it does not.
 */
function gaussNewton(
  problem: LeastSquaresProblem,
  theta: Float64Array,
  state: State,
  moving: Moving,
  chiSquare: number,
  promised: number,
): { theta: Float64Array; chiSquare: number } | null {
  const { step } = orthogonalStep(problem, state, moving, 0);
  const trial = Float64Array.from(theta);
  moving.index.forEach((k, a) => {
    trial[k] = Math.min(Math.max(theta[k]! + step[a]!, problem.lower[k]!), problem.upper[k]!);
  });
  const next = chiSquareAt(problem, trial, state.residual);
  if (!(next <= chiSquare * (1 + NEAR))) return null;
  problem.jacobian(trial, state.jacobian);
  const left = orthogonalStep(problem, state, movable(problem, trial, state), 0).promised;
  return left < promised / 4 ? { theta: trial, chiSquare: next } : null;
}
