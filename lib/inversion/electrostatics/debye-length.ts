import {
  BOLTZMANN_EV_PER_K,
  ELEMENTARY_CHARGE_C,
  NM_PER_CM,
  VACUUM_PERMITTIVITY_F_PER_CM,
} from './constants';
import {
  BULK,
  checkEstimate,
  PERMITTIVITY,
  powerLaw,
  TEMPERATURE,
  type Estimate,
} from './estimate';

export interface DebyeLengthInput {
  /** Majority carriers of the bulk, cm⁻³. */
  bulkPerCm3: Estimate;
  relativePermittivity: Estimate;
  temperatureK: Estimate;
}

/** √(ε₀·k/e²) for N in cm⁻³ and T in K, in nm. */
const COEFFICIENT =
  Math.sqrt((VACUUM_PERMITTIVITY_F_PER_CM * BOLTZMANN_EV_PER_K) / ELEMENTARY_CHARGE_C) * NM_PER_CM;

/**
 * L_D = √(ε_r ε₀ kT/(q² N)), nm (Sze, Physics of Semiconductor Devices, section 2.2, equation 13); independent
 * uncertainties to first order.
 *
 * @throws InversionError for anything that is not a positive number.
 */
export function debyeLengthNm(input: DebyeLengthInput): Estimate {
  const { bulkPerCm3, relativePermittivity, temperatureK } = input;
  checkEstimate(bulkPerCm3, BULK);
  checkEstimate(relativePermittivity, PERMITTIVITY);
  checkEstimate(temperatureK, TEMPERATURE);
  return powerLaw(COEFFICIENT, [
    [relativePermittivity, 0.5],
    [temperatureK, 0.5],
    [bulkPerCm3, -0.5],
  ]);
}
