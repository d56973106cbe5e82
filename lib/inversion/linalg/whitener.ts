import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import { InversionError } from '../errors';

/**
 * W with WᵀW = V⁻¹ over the rows in use, so that (y − ŷ)ᵀV⁻¹(y − ŷ) = ‖W(y − ŷ)‖². Independent points have W = diag(1/σ); a full
 * covariance V = LLᵀ has W = L⁻¹, lower triangular. Rows out of use are zero.
 */
export interface Whitener {
  /** 1/σ of each row, 0 for a row out of use. */
  inverseSigma: Float64Array;
  /** L⁻¹ row-major; null where the points are independent. */
  inverseFactor: Float64Array | null;
}

/** @returns W of independent rows. */
export function diagonalWhitener(sigmas: readonly number[], enabled: readonly boolean[]): Whitener {
  return {
    inverseSigma: Float64Array.from(sigmas, (sigma, i) => (enabled[i] ? 1 / sigma : 0)),
    inverseFactor: null,
  };
}

/**
 * W of rows with covariance V. A row out of use is integrated out: the others keep their own block of V.
 *
 * @throws InversionError 'bad-covariance' where the block in use is not positive definite to rounding.
 */
export function correlatedWhitener(
  covariance: readonly (readonly number[])[],
  enabled: readonly boolean[],
): Whitener {
  const size = covariance.length;
  const used = Array.from(enabled.keys()).filter((i) => enabled[i]);
  const sigma = used.map((i) => Math.sqrt(covariance[i]![i]!));
  // The correlation matrix is factored: units and very different σ then cost no digits.
  const correlation = new Matrix(
    used.map((i, a) =>
      used.map((j, b) => covariance[Math.max(i, j)]![Math.min(i, j)]! / (sigma[a]! * sigma[b]!)),
    ),
  );
  const { lowerTriangularMatrix: factor } = positiveDefinite(correlation);
  const inverseFactor = new Float64Array(size * size);
  for (let b = 0; b < used.length; b++) {
    for (let a = b; a < used.length; a++) {
      let sum = a === b ? 1 : 0;
      for (let c = b; c < a; c++)
        sum -= factor.get(a, c) * inverseFactor[used[c]! * size + used[b]!]! * sigma[b]!;
      inverseFactor[used[a]! * size + used[b]!] = sum / (factor.get(a, a) * sigma[b]!);
    }
  }
  return {
    inverseSigma: Float64Array.from({ length: size }, (_, i) =>
      enabled[i] ? 1 / Math.sqrt(covariance[i]![i]!) : 0,
    ),
    inverseFactor,
  };
}

/** Smallest share of its variance that a point must keep once the points before it are known. */
const SMALLEST_PIVOT = 1e-12;

function positiveDefinite(correlation: Matrix): CholeskyDecomposition {
  const decomposition = new CholeskyDecomposition(correlation);
  const factor = decomposition.lowerTriangularMatrix;
  for (let a = 0; a < correlation.rows; a++) {
    if (factor.get(a, a) ** 2 > SMALLEST_PIVOT) continue;
    throw new InversionError(
      'bad-covariance',
      'The covariance of the points is not positive definite: some combination of points would have no uncertainty.',
    );
  }
  return decomposition;
}

/** column ← W·column, in place, for the rows that begin at `at`. */
export function whiten(
  { inverseSigma, inverseFactor }: Whitener,
  column: Float64Array,
  at = 0,
): void {
  const size = inverseSigma.length;
  if (inverseFactor === null) {
    for (let i = 0; i < size; i++) column[at + i] = column[at + i]! * inverseSigma[i]!;
    return;
  }
  // Row i needs only rows up to i, so that going upwards overwrites nothing still wanted.
  for (let i = size - 1; i >= 0; i--) {
    let sum = 0;
    for (let j = 0; j <= i; j++) sum += inverseFactor[i * size + j]! * column[at + j]!;
    column[at + i] = sum;
  }
}

/** column ← W⁻¹·column, in place: unit noise becomes noise of covariance V. Rows out of use become 0. */
export function unwhiten({ inverseSigma, inverseFactor }: Whitener, column: Float64Array): void {
  const size = inverseSigma.length;
  for (let i = 0; i < size; i++) {
    if (inverseSigma[i] === 0) {
      column[i] = 0;
      continue;
    }
    if (inverseFactor === null) {
      column[i] = column[i]! / inverseSigma[i]!;
      continue;
    }
    let sum = column[i]!;
    for (let j = 0; j < i; j++) sum -= inverseFactor[i * size + j]! * column[j]!;
    column[i] = sum / inverseFactor[i * size + i]!;
  }
}
