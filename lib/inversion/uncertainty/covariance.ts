import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { fillJacobian, foldAt } from '../fit/evaluate';
import type { Problem } from '../fit/model';
import { createNormalEquations, fillNormalEquations } from '../fit/normal-equations';
import type { Covariance, ParameterName } from '../types';

/** Smallest eigenvalue of the scaled normal matrix that still leaves half of the digits of a variance. */
const SMALLEST_EIGENVALUE = 1e-11;

/**
 * Covariance (JᵀV⁻¹J + priors)⁻¹ at the minimum from the analytic Jacobian, over the free parameters that are not at a
 * bound; scaled to unit diagonal before it is inverted, so that units do not matter.
 *
 * @returns ok: false where the data leave a combination of parameters undetermined.
 */
export function covarianceAt(problem: Problem, theta: Float64Array): Covariance {
  const { model } = problem;
  const { size, names } = model;
  const normal = createNormalEquations(size);
  foldAt(model, problem.work, theta);
  fillJacobian(problem, theta);
  fillNormalEquations(problem, theta, normal);
  const inside = Array.from({ length: size }, (_, k) => k).filter(
    (k) => !model.held[k] && theta[k]! > model.lower[k]! && theta[k]! < model.upper[k]!,
  );
  if (inside.length === 0) return { ok: false, reason: 'Every parameter is held or at a bound.' };
  const scale = inside.map((k) => Math.sqrt(normal.matrix[k * size + k]!));
  const blind = inside.find((_, a) => !(scale[a]! > 0));
  if (blind !== undefined)
    return { ok: false, reason: `The points do not depend on ${names[blind]!}.` };
  const scaled = new Matrix(
    inside.map((k, a) =>
      inside.map((l, b) => normal.matrix[k * size + l]! / (scale[a]! * scale[b]!)),
    ),
  );
  return invertScaled(
    scaled,
    scale,
    inside.map((k) => names[k]!),
  );
}

function invertScaled(scaled: Matrix, scale: number[], names: ParameterName[]): Covariance {
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(scaled, {
    assumeSymmetric: true,
  });
  const smallest = Math.min(...realEigenvalues);
  if (!(smallest > SMALLEST_EIGENVALUE)) {
    return {
      ok: false,
      reason: `The points leave a combination of ${names.join(', ')} undetermined.`,
    };
  }
  const weighted = Matrix.mul(eigenvectorMatrix, 1);
  realEigenvalues.forEach((value, k) => weighted.mulColumn(k, 1 / value));
  const inverse = weighted.mmul(eigenvectorMatrix.transpose());
  const matrix = names.map((_, a) =>
    names.map((__, b) => (inverse.get(a, b) + inverse.get(b, a)) / (2 * scale[a]! * scale[b]!)),
  );
  const correlation = matrix.map((row, a) =>
    row.map((value, b) => (a === b ? 1 : value / Math.sqrt(matrix[a]![a]! * matrix[b]![b]!))),
  );
  return { ok: true, names, matrix, correlation };
}
