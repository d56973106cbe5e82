import erfc from '@stdlib/math-base-special-erfc';
import { InversionError } from '../errors';
import type { FitAnswer } from '../types';

export interface ZeroWidthTest {
  /** χ²(sharp) − χ²(graded), ≥ 0. */
  statistic: number;
  pValue: number;
  /** The same as the distance of a normal deviate from its mean, one-sided. */
  sigmas: number;
}

/**
 * Sharp against graded: width zero lies on the boundary, so the statistic follows ½χ²₀ + ½χ²₁ (Self and Liang, J. Am. Stat.
 * Assoc. 82, 605, 1987, case 5) and p = ½·P(χ²₁ > T) = ½ erfc(√(T/2)); a statistic of 0 has p = 1.
 *
 * @throws InversionError when the second fit is not of one graded edge with a free width.
 */
export function zeroWidthTest(sharp: FitAnswer, graded: FitAnswer): ZeroWidthTest {
  const width = graded.parameters.find(({ name }) => name === 'edgeWidthNm');
  const layered = graded.parameters.some(({ name }) => name === 'layerThicknessNm');
  if (!width || width.held || layered) {
    throw new InversionError(
      'wrong-fit',
      'The zero-width test compares a sharp edge with a graded one.',
    );
  }
  const statistic = Math.max(0, sharp.chiSquare - graded.chiSquare);
  const pValue = statistic === 0 ? 1 : 0.5 * erfc(Math.sqrt(statistic / 2));
  // One-sided: P(Z > √T) is ½ erfc(√(T/2)), so the deviate is √T itself.
  return { statistic, pValue, sigmas: Math.sqrt(statistic) };
}
