import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { createNormalEquations } from '../fit/normal-equations';
import { fillNormal } from './joint-polish';
import { whiten, type JointProblem } from './joint-problem';

/** Over the parameters of θ that `indices` names, in that order. */
export type JointCovariance =
  | { ok: true; indices: readonly number[]; matrix: readonly (readonly number[])[] }
  | { ok: false; reason: string };

/** Smallest eigenvalue of the scaled normal matrix that still leaves half of the digits of a variance. */
const SMALLEST_EIGENVALUE = 1e-11;

/**
 * (JᵀV⁻¹J + priors)⁻¹ at θ from the analytic Jacobian, over what is neither held nor at a bound, except that Λ_c and λ₀
 * are kept at zero too, as if they could go below: leaving them out would make the others look better known than they are
 * (λ₀ above zero takes its share from every Λ_c), and the covariance of the Λ_c could not serve as the V of a later fit. An
 * E_A that no point depends on (its Λ_c is zero) is left out.
 */
export function jointCovariance(problem: JointProblem, theta: Float64Array): JointCovariance {
  const { size, captureFrom, held, lower, upper } = problem;
  const normal = createNormalEquations(size);
  fillNormal(problem, whiten(problem, theta), normal);
  const indices = Array.from({ length: size }, (_, k) => k).filter((k) => {
    if (held[k] || !(normal.matrix[k * size + k]! > 0)) return false;
    const isRate = k >= captureFrom;
    return isRate || (theta[k]! > lower[k]! && theta[k]! < upper[k]!);
  });
  const scale = indices.map((k) => Math.sqrt(normal.matrix[k * size + k]!));
  const scaled = new Matrix(
    indices.map((k, a) =>
      indices.map((l, b) => normal.matrix[k * size + l]! / (scale[a]! * scale[b]!)),
    ),
  );
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(scaled, {
    assumeSymmetric: true,
  });
  if (!(Math.min(...realEigenvalues) > SMALLEST_EIGENVALUE)) {
    return {
      ok: false,
      reason:
        'The scans leave a combination of attempt frequency, activation energy, capture rates and background undetermined.',
    };
  }
  const inverse = Matrix.mul(eigenvectorMatrix, 1);
  realEigenvalues.forEach((value, k) => inverse.mulColumn(k, 1 / value));
  const full = inverse.mmul(eigenvectorMatrix.transpose());
  const matrix = indices.map((_, a) =>
    indices.map((__, b) => (full.get(a, b) + full.get(b, a)) / (2 * scale[a]! * scale[b]!)),
  );
  return { ok: true, indices, matrix };
}
