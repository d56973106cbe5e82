import { Matrix, SingularValueDecomposition } from 'ml-matrix';

/** Smallest singular value of the scaled Jacobian, relative to the largest, that still leaves digits of a variance. */
const SMALLEST_SINGULAR = 1e-13;

/**
 * (JᵀJ)⁻¹ of a whitened Jacobian from its singular values, columns scaled to norm one first so that units do not matter; JᵀJ is
 * never formed, so no digits are lost to its square (Golub and Van Loan, Matrix Computations, section 5.5).
 *
 * @param jacobian column-major, jacobian[k·rows + i].
 * @returns the matrix, or the index of a column that is zero, or 'dependent' where the columns are not independent.
 */
export function covarianceOfJacobian(
  jacobian: ArrayLike<number>,
  rows: number,
  size: number,
): { ok: true; matrix: number[][] } | { ok: false; blind: number | 'dependent' } {
  const norms = Array.from({ length: size }, (_, k) => {
    let square = 0;
    for (let i = 0; i < rows; i++) square += jacobian[k * rows + i]! ** 2;
    return Math.sqrt(square);
  });
  const blind = norms.findIndex((norm) => !(norm > 0));
  if (blind >= 0) return { ok: false, blind };
  const scaled = Matrix.zeros(rows, size);
  for (let k = 0; k < size; k++)
    for (let i = 0; i < rows; i++) scaled.set(i, k, jacobian[k * rows + i]! / norms[k]!);
  const { diagonal, rightSingularVectors: v } = new SingularValueDecomposition(scaled, {
    autoTranspose: true,
  });
  const largest = Math.max(...diagonal);
  if (diagonal.length < size || !(Math.min(...diagonal) > SMALLEST_SINGULAR * largest))
    return { ok: false, blind: 'dependent' };
  const entry = (a: number, b: number): number =>
    diagonal.reduce((sum, value, k) => sum + (v.get(a, k) * v.get(b, k)) / value ** 2, 0) /
    (norms[a]! * norms[b]!);
  return {
    ok: true,
    matrix: norms.map((_, a) => norms.map((__, b) => entry(Math.min(a, b), Math.max(a, b)))),
  };
}
