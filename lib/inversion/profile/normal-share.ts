import { NORMAL_REACH, normalInto } from '../statistics/normal-table';
import type { Stretch } from './trial-profile';

const cdf = new Float64Array(1);
const pdf = new Float64Array(1);

/** Φ(distance/width); a step where the width is zero. */
export function normalShare(distanceNm: number, widthNm: number): number {
  if (widthNm === 0) return distanceNm < 0 ? 0 : 1;
  normalInto(distanceNm / widthNm, cdf, pdf, 0);
  return cdf[0]!;
}

/**
 * A quarter of the width is fine enough for five-point quadrature of a function of Φ to 1e-11: the nearest singularity of
 * 1/(1 + KΦ(t)) lies 0.8 off the real axis for K up to 1e4.
 */
export function normalStretch(edgeNm: number, widthNm: number): Stretch {
  return {
    fromNm: edgeNm - NORMAL_REACH * widthNm,
    toNm: edgeNm + NORMAL_REACH * widthNm,
    stepNm: widthNm / 4,
  };
}
