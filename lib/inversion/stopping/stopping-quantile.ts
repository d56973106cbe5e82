import { InversionError } from '../errors';
import type { StoppingProfile } from '../types';

/**
 * Depth (nm) above which the share u of the stopped muons lies: the inverse of the cumulative fraction.
 *
 * @throws InversionError for u outside [0, 1].
 */
export function stoppingQuantile({ edgesNm, mass }: StoppingProfile, u: number): number {
  if (!(u >= 0 && u <= 1)) {
    throw new InversionError('bad-quantile', `A quantile needs a share between 0 and 1, not ${u}.`);
  }
  let share = 0;
  let deepestNm = edgesNm[0]!;
  for (let b = 0; b < mass.length; b++) {
    if (mass[b] === 0) continue;
    const left = edgesNm[b]!;
    const right = edgesNm[b + 1]!;
    if (share + mass[b]! >= u) return left + Math.max(0, (u - share) / mass[b]!) * (right - left);
    share += mass[b]!;
    deepestNm = right;
  }
  return deepestNm;
}
