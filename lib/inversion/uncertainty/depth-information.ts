import type { PreparedFit } from '../fit/prepared-fit';
import { cumulativeStopping } from '../stopping/cumulative-stopping';
import { whiten } from '../linalg/whitener';
import type { FitAnswer, StoppingProfile } from '../types';

/**
 * Relative Fisher information of the scan about the carriers at each depth: a change of s in a thin layer at x moves ŷ_i by
 * contrast·ρ_i(x) per nm, so I(x) ∝ ρ(x)ᵀV⁻¹ρ(x) over the enabled points, divided by its largest value. ρ_i is the
 * mean density between the middles of neighbouring depths.
 *
 * @param depthsNm ascending depths below the cap.
 * @returns one number from 0 to 1 per depth.
 */
export function depthInformation(
  { input, profiles, problem }: PreparedFit,
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
  const { pointOfRow, whitener } = problem.model;
  const used = Array.from(pointOfRow, (index) => profiles[index]!);
  const information = new Float64Array(count);
  const densities = new Float64Array(used.length);
  const stopped = (profile: StoppingProfile, k: number): number =>
    cumulativeStopping(profile, (borders[k]! + input.capThicknessNm) / scale);
  const below = used.map((profile) => stopped(profile, 0));
  for (let k = 0; k < count; k++) {
    const width = borders[k + 1]! - borders[k]!;
    used.forEach((profile, row) => {
      const above = stopped(profile, k + 1);
      densities[row] = width > 0 ? (above - below[row]!) / width : 0;
      below[row] = above;
    });
    whiten(whitener, densities);
    information[k] = densities.reduce((sum, density) => sum + density * density, 0);
  }
  const largest = information.reduce((a, b) => Math.max(a, b), 0);
  return largest > 0 ? information.map((value) => value / largest) : information;
}
