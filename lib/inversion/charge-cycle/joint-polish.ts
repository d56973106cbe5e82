import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { createNormalEquations, solveStep, type NormalEquations } from '../fit/normal-equations';
import type { FitStatus } from '../types';
import { whiten, type JointProblem, type WhitenedRows } from './joint-problem';

export interface JointMinimum {
  theta: Float64Array;
  chiSquare: number;
  status: FitStatus;
  iterations: number;
  /** What the undamped step still promises to take off χ². */
  predictedReduction: number;
}

/** Iterations of the library between two looks at the gradient: it has no test of its own that stops on noisy data. */
const BLOCK = 4;
const MOST_BLOCKS = 40;
const LARGEST_DAMPING = 1e8;
/** Convergence: what χ² may still fall by, relative to 1 + χ². */
const TOLERANCE = 1e-11;

/** A step that promises less than this starts close enough to the bottom to be taken undamped. */
const NEAR = 1;

/**
 * Levenberg-Marquardt in all free parameters by ml-levenberg-marquardt on whitened rows (weights 1), parameters scaled by
 * the diagonal of the normal matrix because its damping is λ·I, analytic Jacobian, held parameters and those pressed
 * against a bound left out because it only clips, stopped by the step that it would still take. Close to the bottom the
 * undamped step is taken instead wherever it keeps what it promises: ν and E_A are correlated to 0.999 and the damping of
 * the library, which never falls below 1e-7, then needs tens of iterations for what two or three such steps do.
 */
export function polishJoint(
  problem: JointProblem,
  start: Float64Array,
  held: Uint8Array = problem.held,
): JointMinimum {
  const normal = createNormalEquations(problem.size);
  const active = new Uint8Array(problem.size);
  let theta = start;
  let rows = whiten(problem, theta);
  let iterations = 0;
  let damping = 1e-4;
  for (let block = 0; ; block++) {
    fillNormal(problem, rows, normal);
    findPressed(problem, theta, held, normal, active);
    const predictedReduction = solveStep(normal, active, 0, 0, 0);
    const converged = predictedReduction <= TOLERANCE * (1 + rows.chiSquare);
    const done = (status: FitStatus): JointMinimum => ({
      theta,
      chiSquare: rows.chiSquare,
      status,
      iterations,
      predictedReduction,
    });
    if (converged) return done('converged');
    if (damping > LARGEST_DAMPING) return done('stalled');
    if (block === MOST_BLOCKS) return done('iteration-limit');
    if (predictedReduction < NEAR) {
      const step = inBounds(
        problem,
        theta.map((value, k) => value + normal.step[k]!),
      );
      const next = whiten(problem, step);
      iterations++;
      if (rows.chiSquare - next.chiSquare > predictedReduction / 2) {
        theta = step;
        rows = next;
        continue;
      }
    }
    const trial = runBlock(problem, theta, normal, active, damping);
    iterations += BLOCK;
    const next = whiten(problem, trial);
    if (next.chiSquare < rows.chiSquare) {
      theta = trial;
      rows = next;
      damping = Math.max(damping / 100, 1e-7);
    } else damping *= 100;
  }
}

/** JᵀJ and the downhill direction Jᵀr of whitened rows. */
export function fillNormal(
  { size }: JointProblem,
  { jacobian, residual, count }: WhitenedRows,
  { matrix, gradient }: NormalEquations,
): void {
  for (let k = 0; k < size; k++) {
    let b = 0;
    for (let row = 0; row < count; row++) b += jacobian[k * count + row]! * residual[row]!;
    gradient[k] = b;
    for (let l = 0; l <= k; l++) {
      let sum = 0;
      for (let row = 0; row < count; row++) {
        sum += jacobian[k * count + row]! * jacobian[l * count + row]!;
      }
      matrix[k * size + l] = matrix[l * size + k] = sum;
    }
  }
}

/** Held, blind (no row depends on it), or at a bound with χ² falling beyond it. */
function findPressed(
  { size, lower, upper }: JointProblem,
  theta: Float64Array,
  held: Uint8Array,
  { matrix, gradient }: NormalEquations,
  active: Uint8Array,
): void {
  for (let k = 0; k < size; k++) {
    const pressed =
      (theta[k]! <= lower[k]! && gradient[k]! <= 0) ||
      (theta[k]! >= upper[k]! && gradient[k]! >= 0);
    active[k] = held[k] || pressed || !(matrix[k * size + k]! > 0) ? 1 : 0;
  }
}

function runBlock(
  problem: JointProblem,
  theta: Float64Array,
  { matrix }: NormalEquations,
  active: Uint8Array,
  damping: number,
): Float64Array {
  const { size, lower, upper } = problem;
  const moving = Array.from({ length: size }, (_, k) => k).filter((k) => !active[k]);
  const scale = moving.map((k) => 1 / Math.sqrt(matrix[k * size + k]!));
  const thetaOf = (parameters: readonly number[]): Float64Array => {
    const point = Float64Array.from(theta);
    moving.forEach((k, a) => {
      point[k]! += parameters[a]! * scale[a]!;
    });
    return inBounds(problem, point);
  };
  const rowsAt = rememberLast((parameters: readonly number[]) =>
    whiten(problem, thetaOf(parameters)),
  );
  const { residual, count } = rowsAt(moving.map(() => 0));
  const { parameterValues } = levenbergMarquardt(
    { x: Array.from(residual.keys()), y: Array.from(residual) },
    (parameters) => {
      const rows = rowsAt(parameters);
      return (row) => residual[row]! - rows.residual[row]!;
    },
    {
      initialValues: moving.map(() => 0),
      minValues: moving.map((k, a) => (lower[k]! - theta[k]!) / scale[a]!),
      maxValues: moving.map((k, a) => (upper[k]! - theta[k]!) / scale[a]!),
      jacobianFunction: (parameters) => {
        const { jacobian } = rowsAt(parameters);
        return (row) => moving.map((k, a) => jacobian[k * count + row]! * scale[a]!);
      },
      damping,
      maxIterations: BLOCK,
      errorTolerance: 0,
    },
  );
  return thetaOf(parameterValues);
}

function inBounds({ lower, upper }: JointProblem, theta: Float64Array): Float64Array {
  return theta.map((value, k) => Math.min(Math.max(value, lower[k]!), upper[k]!));
}

/** The library asks for value, error and Jacobian of one point in turn: compute it once. */
function rememberLast(
  compute: (parameters: readonly number[]) => WhitenedRows,
): (parameters: readonly number[]) => WhitenedRows {
  let last: readonly number[] | null = null;
  let rows: WhitenedRows | null = null;
  return (parameters) => {
    if (rows && last?.every((value, k) => value === parameters[k])) return rows;
    last = Array.from(parameters);
    rows = compute(parameters);
    return rows;
  };
}
