/**
 * Value at left + t·width of the quintic that meets value, slope and curvature at both ends of a panel; its error is
 * width⁶·f⁽⁶⁾/46080 at most (de Boor, A Practical Guide to Splines, chapter II, Hermite interpolation).
 */
export function quinticHermite(
  t: number,
  width: number,
  left: number,
  leftSlope: number,
  leftCurvature: number,
  right: number,
  rightSlope: number,
  rightCurvature: number,
): number {
  const a = leftSlope * width;
  const b = (leftCurvature * width * width) / 2;
  const c = rightSlope * width;
  const d = (rightCurvature * width * width) / 2;
  const rise = right - left;
  const c3 = 10 * rise - 6 * a - 4 * c - 3 * b + d;
  const c4 = -15 * rise + 8 * a + 7 * c + 3 * b - 2 * d;
  const c5 = 6 * rise - 3 * a - 3 * c - b + d;
  return left + t * (a + t * (b + t * (c3 + t * (c4 + t * c5))));
}
