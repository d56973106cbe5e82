import type { Flag, ProfileUnit } from '../types';
import type { FreeFormBands } from './free-form-bands';
import type { PreparedFreeForm } from './prepare-free-form';
import type { FreeFormSolution } from './solve-free-form';
import { valueAtDepth } from './value-at-depth';

/**
 * A point of a free-form profile; a value or an end of a band is null above the ceiling of a saturating fraction, or without
 * bands.
 */
export interface FreeFormPoint {
  depthNm: number;
  value: number | null;
  lower68: number | null;
  upper68: number | null;
  lower95: number | null;
  upper95: number | null;
  flag: Exclude<Flag, 'below floor'>;
}

export interface FreeFormProfile {
  unit: ProfileUnit;
  bands: 'bootstrap' | null;
  points: readonly FreeFormPoint[];
  /** 95 % stopping quantile of the deepest energy used, below the cap, nm. */
  reachNm: number;
}

/** Evenly spaced depths beside the knots, unless the caller gives his own. */
const EVEN = 200;

/**
 * The profile of a free-form solution over depth: value, bands and flag. The unknown is linear between knots and constant
 * beyond the last, the value follows from it point by point. 'beyond reach' is below the 95 % stopping quantile of the deepest
 * enabled energy.
 *
 * @param options.depthsNm depths wanted, nm below the cap; those of the bands, or the knots and 200 even steps, when left out.
 */
export function freeFormProfile(
  prepared: PreparedFreeForm,
  solution: Pick<FreeFormSolution, 'unknowns' | 'unit'>,
  bands: FreeFormBands | null = null,
  options: { depthsNm?: ArrayLike<number> } = {},
): FreeFormProfile {
  const { knotsNm, reachNm, observation } = prepared;
  const depthsNm = bands?.depthsNm ?? options.depthsNm ?? freeFormDepths(prepared);
  return {
    unit: solution.unit,
    bands: bands ? 'bootstrap' : null,
    points: Array.from(depthsNm, (depthNm, k) => ({
      depthNm,
      value: observation.line.valueOf(valueAtDepth(knotsNm, solution.unknowns, depthNm)),
      lower68: bands?.lower68[k] ?? null,
      upper68: bands?.upper68[k] ?? null,
      lower95: bands?.lower95[k] ?? null,
      upper95: bands?.upper95[k] ?? null,
      flag: depthNm > reachNm ? 'beyond reach' : 'supported',
    })),
    reachNm,
  };
}

/** The knots and 200 even steps from the surface to the last of them, nm. */
export function freeFormDepths({ knotsNm }: PreparedFreeForm): number[] {
  const endNm = knotsNm[knotsNm.length - 1]!;
  const depths = new Set<number>(knotsNm);
  for (let k = 0; k <= EVEN; k++) depths.add((endNm * k) / EVEN);
  return [...depths].sort((a, b) => a - b);
}
