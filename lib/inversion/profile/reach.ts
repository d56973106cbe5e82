import { stoppingQuantile } from '../stopping/stopping-quantile';
import type { PreparedFit } from '../fit/prepared-fit';
import type { ParameterValues } from '../types';

/** Depth below the cap that the scan reaches: 95 % stopping quantile of the deepest enabled energy, times the depth scale. */
export function reachOf(
  prepared: PreparedFit,
  { depthScale = 1 }: ParameterValues,
  quantile = 0.95,
): number {
  const { input, profiles } = prepared;
  let deepest = 0;
  profiles.forEach((profile, index) => {
    if (profile && input.points[index]!.enabled)
      deepest = Math.max(deepest, stoppingQuantile(profile, quantile));
  });
  return Math.max(0, deepest * depthScale - input.capThicknessNm);
}
