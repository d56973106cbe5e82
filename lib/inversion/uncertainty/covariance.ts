import { fillJacobian, foldAt } from '../fit/evaluate';
import type { Problem } from '../fit/model';
import { covarianceOfJacobian } from '../linalg/covariance-of-jacobian';
import { IN_WORDS } from '../parameter-words';
import type { Covariance, ParameterName } from '../types';

/**
 * Covariance (JᵀV⁻¹J + priors)⁻¹ at the minimum from the analytic Jacobian, over the free parameters that are not at a bound.
 * Priors are rows of the Jacobian.
 *
 * @returns ok: false where the data leave a combination of parameters undetermined.
 */
export function covarianceAt(problem: Problem, theta: Float64Array): Covariance {
  const { model, work } = problem;
  const { rowCount, size, priorInverseSigma } = model;
  foldAt(model, work, theta);
  fillJacobian(problem, theta);
  const inside = Array.from({ length: size }, (_, k) => k).filter(
    (k) => !model.held[k] && theta[k]! > model.lower[k]! && theta[k]! < model.upper[k]!,
  );
  const names = inside.map((k) => model.names[k]!);
  if (inside.length === 0) return { ok: false, reason: 'Every parameter is held or at a bound.' };
  const rows = rowCount + inside.length;
  const jacobian = new Float64Array(rows * inside.length);
  inside.forEach((k, a) => {
    jacobian.set(work.jacobian.subarray(k * rowCount, (k + 1) * rowCount), a * rows);
    jacobian[a * rows + rowCount + a] = priorInverseSigma[k]!;
  });
  const result = covarianceOfJacobian(jacobian, rows, inside.length);
  if (!result.ok) {
    const reason =
      result.blind === 'dependent'
        ? `The points leave a combination of ${names.map((name) => IN_WORDS[name]).join(', ')} undetermined.`
        : `The points do not depend on ${IN_WORDS[names[result.blind]!]}.`;
    return { ok: false, reason };
  }
  const { matrix } = result;
  const correlation = matrix.map((row, a) =>
    row.map((value, b) => (a === b ? 1 : value / Math.sqrt(matrix[a]![a]! * matrix[b]![b]!))),
  );
  return { ok: true, names, matrix, correlation };
}

/** σ of a parameter; null where the covariance does not have it. */
export function sigmaOf(covariance: Covariance, name: ParameterName): number | null {
  if (!covariance.ok) return null;
  const k = covariance.names.indexOf(name);
  return k < 0 ? null : Math.sqrt(covariance.matrix[k]![k]!);
}
