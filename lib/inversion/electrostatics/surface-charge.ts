import { type BandBendingInput, reducedPotentials } from './band-bending-input';
import {
  BOLTZMANN_EV_PER_K,
  ELEMENTARY_CHARGE_C,
  NM_PER_CM,
  VACUUM_PERMITTIVITY_F_PER_CM,
} from './constants';
import { debyeLengthNm } from './debye-length';
import { spaceChargeFunction } from './space-charge';

export interface SurfaceCharge {
  /** Field just below the surface, V/cm; > 0 where majority carriers are depleted. */
  surfaceFieldVPerCm: number;
  /** Charge of the whole space-charge layer in elementary charges, cm⁻²; > 0 where majority carriers are depleted. */
  sheetChargePerCm2: number;
}

/**
 * Field and sheet charge of a space-charge layer with mobile carriers included: E_s = ±(√2 kT/(q L_D))·F(φ_s/kT) and
 * Q/q = ε E_s/q (Kingston and Neustadter 1955; Sze, section 4.2.1, equations 11 to 13). In full depletion Q/q tends to N·W.
 *
 * @throws InversionError for what reducedPotentials refuses.
 */
export function surfaceCharge(input: BandBendingInput): SurfaceCharge {
  const { surface, fermi } = reducedPotentials(input);
  const lengthCm = debyeLengthOf(input) / NM_PER_CM;
  const kT = BOLTZMANN_EV_PER_K * input.temperatureK;
  const surfaceFieldVPerCm =
    ((Math.sign(surface) * Math.SQRT2 * kT) / lengthCm) * spaceChargeFunction(surface, fermi);
  const chargePerField =
    (input.relativePermittivity * VACUUM_PERMITTIVITY_F_PER_CM) / ELEMENTARY_CHARGE_C;
  return { surfaceFieldVPerCm, sheetChargePerCm2: surfaceFieldVPerCm * chargePerField };
}

/** L_D of the majority carriers, nm. */
export function debyeLengthOf(input: BandBendingInput): number {
  const exact = (value: number) => ({ value, sigma: 0 });
  return debyeLengthNm({
    bulkPerCm3: exact(input.bulkPerCm3),
    relativePermittivity: exact(input.relativePermittivity),
    temperatureK: exact(input.temperatureK),
  }).value;
}
