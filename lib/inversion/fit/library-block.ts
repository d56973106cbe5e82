import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import {
  chiSquareAt,
  type LeastSquaresProblem,
  type Moving,
  type State,
  type Trial,
} from './least-squares-problem';

/** Most iterations of the library between two looks at the gradient: it has no test of its own that stops on noisy data. */
export const BLOCK = 3;

/** A few iterations of ml-levenberg-marquardt on the movable parameters, scaled to order one. */
export function runLibraryBlock(
  problem: LeastSquaresProblem,
  theta: Float64Array,
  { jacobian, predicted }: State,
  { index, scale }: Moving,
  damping: number,
  maxIterations: number,
): Trial {
  const { rows, lower, upper, target } = problem;
  const point = Float64Array.from(theta);
  const at = new Array<number>(index.length).fill(NaN);
  // The library asks for value, error and Jacobian of one point in turn: compute each once.
  let differentiated = false;
  const moveTo = (parameters: readonly number[]): void => {
    if (parameters.every((value, a) => value === at[a])) return;
    parameters.forEach((value, a) => {
      at[a] = value;
      point[index[a]!] = value * scale[a]!;
    });
    problem.predict(point, predicted);
    differentiated = false;
  };
  const run = (): { parameterValues: number[]; iterations: number } =>
    levenbergMarquardt(
      { x: Array.from({ length: rows }, (_, i) => i), y: Array.from(target) },
      (parameters) => {
        moveTo(parameters);
        // Infinity would make the library's matrices meaningless; at NaN it stops and keeps its best point.
        return (i) => (Number.isFinite(predicted[i]!) ? predicted[i]! : NaN);
      },
      {
        initialValues: index.map((k, a) => theta[k]! / scale[a]!),
        minValues: index.map((k, a) => lower[k]! / scale[a]!),
        maxValues: index.map((k, a) => upper[k]! / scale[a]!),
        jacobianFunction: (parameters) => {
          moveTo(parameters);
          if (!differentiated) problem.jacobian(point, jacobian);
          differentiated = true;
          return (i) => index.map((k, a) => jacobian[k * rows + i]! * scale[a]!);
        },
        damping,
        maxIterations,
        errorTolerance: 0,
      },
    );
  const block = attempt(run);
  if (!block) return { theta, chiSquare: Infinity, iterations: 0, damping };
  index.forEach((k, a) => {
    point[k] = Math.min(Math.max(block.parameterValues[a]! * scale[a]!, lower[k]!), upper[k]!);
  });
  return {
    theta: point,
    chiSquare: chiSquareAt(problem, point, predicted),
    iterations: block.iterations,
    damping,
  };
}

/** The library throws where its matrix JᵀJ + λ·I is singular to rounding: there it has no step to offer. Anything else is an error. */
function attempt<T>(run: () => T): T | null {
  try {
    return run();
  } catch (error) {
    if (error instanceof Error && /singular|not symmetric/i.test(error.message)) return null;
    throw error;
  }
}
