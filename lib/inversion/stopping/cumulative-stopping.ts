import type { StoppingProfile } from '../types';

/** C_E(x): share of the stopped muons at depths up to x nm. Piecewise linear, since the density in a bin is uniform. */
export function cumulativeStopping({ edgesNm, mass }: StoppingProfile, xNm: number): number {
  let share = 0;
  for (let b = 0; b < mass.length; b++) {
    const left = edgesNm[b]!;
    const right = edgesNm[b + 1]!;
    if (xNm >= right) share += mass[b]!;
    else return xNm <= left ? share : share + (mass[b]! * (xNm - left)) / (right - left);
  }
  return 1;
}
