import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { leastSquares, type LeastSquaresOptions } from '@/lib/inversion/fit/least-squares';
import { chiSquareAt, type LeastSquaresProblem } from '@/lib/inversion/fit/least-squares-problem';
import { covarianceOfJacobian } from '@/lib/inversion/linalg/covariance-of-jacobian';
import { nistProblem } from './nist';
import { nistLinearProblem } from './nist-linear';

/** Digits that agree with the certified numbers, of the worst parameter. */
export interface Digits {
  values: number;
  errors: number;
  residualSum: number;
}

/** Digits of the certified values: eleven of the nonlinear problems, fifteen of the linear ones. */
const MOST_NONLINEAR = 11;
const MOST_LINEAR = 15;

/** −log₁₀ of the relative difference of the worst number, of the absolute one where the certified number is 0; never below 0. */
function digitsOf(found: ArrayLike<number>, certified: readonly number[], most: number): number {
  return Math.min(
    ...certified.map((c, k) => {
      const difference = Math.abs(found[k]! - c) / (c === 0 ? 1 : Math.abs(c));
      return Math.max(0, Math.min(most, -Math.log10(difference)));
    }),
  );
}

interface Certified {
  values: readonly number[];
  errors: readonly number[];
  residualSum: number;
  most: number;
}

function solveFrom(
  problem: LeastSquaresProblem,
  theta: Float64Array,
  options: LeastSquaresOptions,
  certified: Certified,
): Digits {
  const { size, rows } = problem;
  const { chiSquare } = leastSquares(problem, theta, options);
  const jacobian = new Float64Array(rows * size);
  problem.jacobian(theta, jacobian);
  const covariance = covarianceOfJacobian(jacobian, rows, size);
  const digits = {
    values: digitsOf(theta, certified.values, certified.most),
    residualSum: digitsOf([chiSquare], [certified.residualSum], certified.most),
  };
  if (!covariance.ok) return { ...digits, errors: 0 };
  const errors = covariance.matrix.map((row, k) =>
    Math.sqrt((row[k]! * chiSquare) / (rows - size)),
  );
  return { ...digits, errors: digitsOf(errors, certified.errors, certified.most) };
}

export function solveNonlinear(name: string, start: 0 | 1): Digits {
  const { starts, certified, standardErrors, residualSum, problem } = nistProblem(name);
  return solveFrom(
    problem,
    Float64Array.from(starts[start]),
    { tolerance: 1e-18, floor: 0, mostRounds: 400 },
    { values: certified, errors: standardErrors, residualSum, most: MOST_NONLINEAR },
  );
}

/**
 * From zero. What a step promises never exceeds Σy², so a floor of 10¹⁰ times that makes every step one of the undamped
 * orthogonal ones that end a fit: a linear problem needs no other, and none that is damped is as good.
 */
export function solveLinear(name: string): Digits {
  const { certified, standardErrors, residualSum, problem } = nistLinearProblem(name);
  const floor = 1e10 * Array.from(problem.target).reduce((sum, y) => sum + y * y, 0);
  return solveFrom(
    problem,
    new Float64Array(problem.size),
    { tolerance: 1e-36, floor, mostRounds: 100 },
    { values: certified, errors: standardErrors, residualSum, most: MOST_LINEAR },
  );
}

export type LibrarySettings = 'defaults' | 'best';

/**
 * Digits of the values that ml-levenberg-marquardt reaches by itself: with nothing but the start given, or as well served as it
 * can be, with the analytic Jacobian, 1,000 iterations and no early stop. 0 where it throws.
 */
export function libraryAlone(name: string, start: 0 | 1, settings: LibrarySettings): number {
  const { starts, certified, problem } = nistProblem(name);
  const { rows, size } = problem;
  const predicted = new Float64Array(rows);
  const jacobian = new Float64Array(rows * size);
  const served = {
    jacobianFunction: (theta: number[]) => {
      problem.jacobian(theta, jacobian);
      return (i: number) => Array.from({ length: size }, (_, k) => jacobian[k * rows + i]!);
    },
    maxIterations: 1000,
    errorTolerance: 0,
  };
  try {
    const { parameterValues } = levenbergMarquardt(
      { x: Array.from({ length: rows }, (_, i) => i), y: Array.from(problem.target) },
      (theta) => {
        problem.predict(theta, predicted);
        const values = Array.from(predicted);
        return (i: number) => values[i]!;
      },
      { initialValues: starts[start], ...(settings === 'best' ? served : {}) },
    );
    const finite = Number.isFinite(chiSquareAt(problem, parameterValues, predicted));
    return finite ? digitsOf(parameterValues, certified, MOST_NONLINEAR) : 0;
  } catch {
    return 0;
  }
}
