import type { ScanPoint, StoppingProfile } from '@/lib/inversion/index';
import { createHash } from 'node:crypto';

import { canonicalJson } from './canonical-json';
import { sha256 } from './sha256';

/** SHA-256 of what a fit sees of the points: energy, value, σ and whether each is switched on. */
export function pointsSha256(points: readonly ScanPoint[]): string {
  const seen = points.map(({ energyKeV, value, sigma, enabled }) => ({
    energyKeV,
    value,
    sigma,
    enabled,
  }));
  return sha256(canonicalJson(seen));
}

/** SHA-256 of the profiles in ascending energy, one at a time: a large set never stands in memory as text. */
export function stoppingSha256(profiles: readonly StoppingProfile[]): string {
  const hash = createHash('sha256');
  for (const { energyKeV, edgesNm, mass, lostShare } of profiles) {
    const plain = { energyKeV, edgesNm: [...edgesNm], mass: [...mass], lostShare };
    hash.update(canonicalJson(plain)).update('\n');
  }
  return hash.digest('hex');
}
