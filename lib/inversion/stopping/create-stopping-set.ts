import { MAX_ENERGIES } from '../constants';
import { InversionError } from '../errors';
import type { StoppingProfile, StoppingSet } from '../types';
import { sameEnergy } from './same-energy';

/**
 * Stopping profiles of one layer stack in ascending energy.
 *
 * @throws InversionError for an empty set, more than MAX_ENERGIES profiles, or two profiles of one energy.
 */
export function createStoppingSet(profiles: readonly StoppingProfile[]): StoppingSet {
  if (profiles.length === 0) {
    throw new InversionError(
      'empty-stopping-set',
      'A stopping set needs at least one stopping profile.',
    );
  }
  if (profiles.length > MAX_ENERGIES) {
    throw new InversionError(
      'too-many-energies',
      `The stopping set holds ${profiles.length} energies; at most ${MAX_ENERGIES} are taken.`,
    );
  }
  const sorted = [...profiles].sort((a, b) => a.energyKeV - b.energyKeV);
  for (let i = 1; i < sorted.length; i++) {
    if (sameEnergy(sorted[i]!.energyKeV, sorted[i - 1]!.energyKeV)) {
      throw new InversionError(
        'duplicate-energy',
        `The stopping set holds two profiles for ${sorted[i]!.energyKeV} keV.`,
        { energyKeV: sorted[i]!.energyKeV },
      );
    }
  }
  return { profiles: sorted };
}
