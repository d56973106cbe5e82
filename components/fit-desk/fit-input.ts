import {
  createStoppingProfile,
  createStoppingSet,
  type FitInput,
  type ScanPoint,
  type StoppingSet,
} from '@/lib/inversion/index';
import type { Scan } from '@/lib/schemas/scan';
import type { StoppingSetAnswer } from '@/lib/schemas/stopping-set';

import type { Assumptions } from './assumptions';

/** A stored stopping set as the inversion takes it. */
export function stoppingSetOf({ profiles }: Pick<StoppingSetAnswer, 'profiles'>): StoppingSet {
  return createStoppingSet(
    profiles.map(({ energyKeV, edgesNm, mass, lostShare }) =>
      createStoppingProfile({
        energyKeV,
        positionsNm: edgesNm,
        positionsAre: 'edges',
        weights: mass,
        weightsAre: 'counts',
        lostShare: lostShare ?? undefined,
      }),
    ),
  );
}

/** Points as this fit uses them: switched off in the scan or for this fit alone. */
export function pointsOf(
  points: readonly ScanPoint[],
  switchedOffKeV: readonly number[],
): ScanPoint[] {
  return points.map(({ energyKeV, value, sigma, enabled }) => ({
    energyKeV,
    value,
    sigma,
    enabled: enabled && !switchedOffKeV.includes(energyKeV),
  }));
}

/** Everything the inversion needs, from the scan, the assumptions and the stopping set. */
export function fitInputOf(
  scan: Pick<Scan, 'observable'> & { points: readonly ScanPoint[] },
  assumptions: Omit<Assumptions, 'stoppingSetId'>,
  stopping: StoppingSet,
): FitInput {
  return {
    observable: scan.observable,
    points: pointsOf(scan.points, assumptions.switchedOffKeV),
    stopping,
    profile: assumptions.profile,
    polarity: assumptions.polarity,
    response: assumptions.response,
    carriers: assumptions.carriers,
    capThicknessNm: assumptions.capThicknessNm,
    parameters: assumptions.parameters,
  };
}

/** Energies in use that lie outside a ladder of stopping energies; those inside are interpolated. */
export function uncoveredEnergies(
  points: readonly Pick<ScanPoint, 'energyKeV' | 'enabled'>[],
  ladderKeV: readonly number[],
): number[] {
  const [low, high] = [Math.min(...ladderKeV), Math.max(...ladderKeV)];
  const slack = 1e-9;
  return points
    .filter(
      ({ enabled, energyKeV }) =>
        enabled && (energyKeV < low * (1 - slack) || energyKeV > high * (1 + slack)),
    )
    .map(({ energyKeV }) => energyKeV);
}

/** Energies that even the best of several sets leaves uncovered; none without sets, which is said elsewhere. */
export function leastUncovered(
  points: readonly Pick<ScanPoint, 'energyKeV' | 'enabled'>[],
  sets: readonly { energiesKeV: readonly number[] }[],
): number[] {
  const missing = sets.map(({ energiesKeV }) => uncoveredEnergies(points, energiesKeV));
  return missing.sort((a, b) => a.length - b.length)[0] ?? [];
}
