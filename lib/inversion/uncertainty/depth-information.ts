import type { PreparedFit } from '../fit/prepared-fit';
import { cumulativeStopping } from '../stopping/cumulative-stopping';
import type { FitAnswer } from '../types';

/**
 * Relative Fisher information of the scan about the carriers at each depth: a change of s in a thin layer at x moves ŷ_i by
 * contrast·ρ_i(x) per nm, so I(x) ∝ Σ_i (ρ_i(x)/σ_i)² over the enabled points, divided by its largest value. ρ_i is the
 * mean density between the middles of neighbouring depths.
 *
 * @param depthsNm ascending depths below the cap.
 * @returns one number from 0 to 1 per depth.
 */
export function depthInformation(
  { input, profiles }: PreparedFit,
  answer: FitAnswer,
  depthsNm: ArrayLike<number>,
): Float64Array {
  const scale = answer.parameters.find(({ name }) => name === 'depthScale')?.value ?? 1;
  const count = depthsNm.length;
  const borders = Float64Array.from({ length: count + 1 }, (_, k) => {
    if (k === 0) return depthsNm[0]!;
    if (k === count) return depthsNm[count - 1]!;
    return (depthsNm[k - 1]! + depthsNm[k]!) / 2;
  });
  const information = new Float64Array(count);
  profiles.forEach((profile, index) => {
    const { sigma, enabled } = input.points[index]!;
    if (!profile || !enabled) return;
    let below = cumulativeStopping(profile, (borders[0]! + input.capThicknessNm) / scale);
    for (let k = 0; k < count; k++) {
      const above = cumulativeStopping(profile, (borders[k + 1]! + input.capThicknessNm) / scale);
      const width = borders[k + 1]! - borders[k]!;
      if (width > 0) information[k] = information[k]! + ((above - below) / width / sigma) ** 2;
      below = above;
    }
  });
  const largest = information.reduce((a, b) => Math.max(a, b), 0);
  return largest > 0 ? information.map((value) => value / largest) : information;
}
