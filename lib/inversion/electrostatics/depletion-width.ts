import { ELEMENTARY_CHARGE_C, NM_PER_CM, VACUUM_PERMITTIVITY_F_PER_CM } from './constants';
import { checkEstimate, DOPING, PERMITTIVITY, powerLaw, type Estimate } from './estimate';

export interface DepletionWidthInput {
  /** φ_s, eV: how far the bands bend at the surface, towards depletion. */
  bandBendingEv: Estimate;
  /** Net ionised doping, cm⁻³. */
  dopingPerCm3: Estimate;
  relativePermittivity: Estimate;
}

/**
 * W = √(2 ε_r ε₀ φ_s/(q N)), nm: abrupt (full) depletion (Sze, section 2.2.1; Neamen, section 10.1). Independent
 * uncertainties to first order. At equal band bending W ∝ N^(−1/2): ten times the doping, about a third of the width.
 *
 * @throws InversionError for anything that is not a positive number.
 */
export function depletionWidthNm(input: DepletionWidthInput): Estimate {
  const { bandBendingEv, dopingPerCm3, relativePermittivity } = input;
  checkEstimate(bandBendingEv, { name: 'band bending', unit: 'eV' });
  checkEstimate(dopingPerCm3, DOPING);
  checkEstimate(relativePermittivity, PERMITTIVITY);
  const squareCm = (2 * VACUUM_PERMITTIVITY_F_PER_CM) / ELEMENTARY_CHARGE_C;
  return powerLaw(Math.sqrt(squareCm) * NM_PER_CM, [
    [relativePermittivity, 0.5],
    [bandBendingEv, 0.5],
    [dopingPerCm3, -0.5],
  ]);
}
