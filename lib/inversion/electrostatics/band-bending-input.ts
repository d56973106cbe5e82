import { InversionError } from '../errors';
import { BOLTZMANN_EV_PER_K } from './constants';
import { BULK, checkPositive, PERMITTIVITY, TEMPERATURE } from './estimate';

/** A bulk and how far its bands bend at the surface. */
export interface BandBendingInput {
  /** φ_s, eV: > 0 depletes the majority carriers (bands down in p-type, up in n-type), < 0 accumulates them. */
  bandBendingEv: number;
  /** N: majority carriers of the bulk, cm⁻³. */
  bulkPerCm3: number;
  relativePermittivity: number;
  temperatureK: number;
  /** φ_F, eV, from which the minority carriers of the bulk follow: N·e^(−2φ_F/kT). null leaves them out. */
  fermiPotentialEv: number | null;
}

/** Largest exponent taken: far beyond any surface that Boltzmann statistics describe, well below overflow. */
const LARGEST_EXPONENT = 300;

/**
 * v_s = φ_s/kT and u_F = φ_F/kT (∞ without minority carriers).
 *
 * @throws InversionError for numbers that are not finite or not positive where they must be, and for bands bent so far
 * that the surface would hold e³⁰⁰ times the majority carriers of the bulk.
 */
export function reducedPotentials(input: BandBendingInput): { surface: number; fermi: number } {
  checkPositive(input.bulkPerCm3, BULK);
  checkPositive(input.relativePermittivity, PERMITTIVITY);
  checkPositive(input.temperatureK, TEMPERATURE);
  if (!Number.isFinite(input.bandBendingEv)) {
    throw new InversionError('bad-number', `The band bending cannot be ${input.bandBendingEv} eV.`);
  }
  const { fermiPotentialEv } = input;
  if (fermiPotentialEv !== null && !(fermiPotentialEv >= 0 && Number.isFinite(fermiPotentialEv))) {
    throw new InversionError('bad-number', `The Fermi potential cannot be ${fermiPotentialEv} eV.`);
  }
  const kT = BOLTZMANN_EV_PER_K * input.temperatureK;
  const surface = input.bandBendingEv / kT;
  const fermi = fermiPotentialEv === null ? Infinity : fermiPotentialEv / kT;
  if (-surface > LARGEST_EXPONENT || surface - 2 * fermi > LARGEST_EXPONENT) {
    throw new InversionError(
      'bent-too-far',
      `Bands bent by ${input.bandBendingEv} eV at ${input.temperatureK} K would hold more carriers than there are atoms.`,
      { bandBendingEv: input.bandBendingEv },
    );
  }
  return { surface, fermi };
}
