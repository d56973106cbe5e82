/** u at a depth: linear between knots, constant outside them; `at` is where the knots begin in `u`. */
export function valueAtDepth(
  knotsNm: ArrayLike<number>,
  u: ArrayLike<number>,
  depthNm: number,
  at = 0,
): number {
  const last = knotsNm.length - 1;
  if (depthNm <= knotsNm[0]!) return u[at]!;
  if (depthNm >= knotsNm[last]!) return u[at + last]!;
  let low = 0;
  let high = last;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if (knotsNm[middle]! <= depthNm) low = middle;
    else high = middle;
  }
  const t = (depthNm - knotsNm[low]!) / (knotsNm[high]! - knotsNm[low]!);
  return (1 - t) * u[at + low]! + t * u[at + high]!;
}
