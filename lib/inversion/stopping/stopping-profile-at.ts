import { InversionError } from '../errors';
import type { StoppingProfile, StoppingSet } from '../types';
import { interpolateByQuantiles } from './interpolate-by-quantiles';
import { sameEnergy } from './same-energy';

/**
 * The stopping profile of an energy: from the set where it has one, else interpolated between its two
 * neighbours by quantiles, marked. Never extrapolated.
 *
 * @throws InversionError 'energy-outside-stopping-set'.
 */
export function stoppingProfileAt({ profiles }: StoppingSet, energyKeV: number): StoppingProfile {
  const exact = profiles.find((profile) => sameEnergy(profile.energyKeV, energyKeV));
  if (exact) return exact;
  const next = profiles.findIndex((profile) => profile.energyKeV > energyKeV);
  if (!(next > 0)) {
    const first = profiles[0]!.energyKeV;
    const last = profiles[profiles.length - 1]!.energyKeV;
    throw new InversionError(
      'energy-outside-stopping-set',
      `The scan has a point at ${energyKeV} keV, but the stopping set reaches only from ${first} to ${last} keV; stopping profiles are never extrapolated.`,
      { energyKeV, firstKeV: first, lastKeV: last },
    );
  }
  return interpolateByQuantiles(profiles[next - 1]!, profiles[next]!, energyKeV);
}
