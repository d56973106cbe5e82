import type { Ridge } from '@/components/charts/chart-types';
import type { CarrierProfile, ProfilePoint } from '@/lib/inversion/index';

/** Share of the loudest energy from which on an energy is said to speak about a depth. */
const SPEAKS_FROM = 0.5;

export interface Voice {
  energyKeV: number;
  /** Its share of all that is said about this depth; all shares sum to 1. */
  share: number;
}

/**
 * Which energies speak about a depth: each weighs (stopping density there / σ)², the information that
 * its point brings about carriers at that depth alone. Loudest first, down to half of the loudest.
 */
export function voicesAt(
  depthNm: number,
  ridges: readonly Ridge[],
  sigmas: ReadonlyMap<number, number>,
  { depthScale, capThicknessNm }: { depthScale: number; capThicknessNm: number },
): Voice[] {
  const stackDepth = (depthNm + capThicknessNm) / depthScale;
  const weights = ridges.map((ridge) => {
    const sigma = sigmas.get(ridge.energyKeV);
    return {
      energyKeV: ridge.energyKeV,
      weight: sigma === undefined ? 0 : (densityAt(ridge, stackDepth) / sigma) ** 2,
    };
  });
  const total = weights.reduce((sum, { weight }) => sum + weight, 0);
  if (!(total > 0)) return [];
  const loudest = Math.max(...weights.map(({ weight }) => weight));
  return weights
    .filter(({ weight }) => weight >= SPEAKS_FROM * loudest)
    .map(({ energyKeV, weight }) => ({ energyKeV, share: weight / total }))
    .sort((a, b) => b.share - a.share);
}

function densityAt({ edgesNm, mass }: Ridge, xNm: number): number {
  let [low, high] = [0, mass.length];
  if (xNm < edgesNm[0]! || xNm >= edgesNm[high]!) return 0;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (edgesNm[middle]! <= xNm) low = middle;
    else high = middle;
  }
  return mass[low]! / (edgesNm[low + 1]! - edgesNm[low]!);
}

/** The profile point nearest to a depth; null for an empty profile. */
export function profileAt({ points }: CarrierProfile, depthNm: number): ProfilePoint | null {
  return points.reduce<ProfilePoint | null>(
    (nearest, point) =>
      nearest === null || Math.abs(point.depthNm - depthNm) < Math.abs(nearest.depthNm - depthNm)
        ? point
        : nearest,
    null,
  );
}
