import type { ScanPoint, StoppingProfile } from '@/lib/inversion/index';

import { canonicalJson } from './canonical-json';
import { toBlob } from './float-blob';
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

/**
 * SHA-256 of the profiles in ascending energy: of canonical JSON in which edges and masses stand as
 * the hashes of their little-endian 64-bit floats. As text, millions of numbers would take seconds.
 */
export function stoppingSha256(profiles: readonly StoppingProfile[]): string {
  const seen = profiles.map(({ energyKeV, edgesNm, mass, lostShare }) => ({
    energyKeV,
    edgesSha256: sha256(toBlob(edgesNm)),
    massSha256: sha256(toBlob(mass)),
    lostShare,
  }));
  return sha256(canonicalJson(seen));
}
