/** Knots unless the caller asks for another number, and the most that are taken. */
export const DEFAULT_KNOTS = 40;
export const MAX_KNOTS = 200;

/** Knots evenly spaced in √x from 0 to endNm, so that they are closest where stopping profiles are narrowest. */
export function rootSpacedKnots(endNm: number, count = DEFAULT_KNOTS): Float64Array {
  return Float64Array.from({ length: count }, (_, j) => endNm * (j / (count - 1)) ** 2);
}
