import {
  BOLTZMANN_EV_PER_K,
  ELEMENTARY_CHARGE_C,
  NM_PER_CM,
  VACUUM_PERMITTIVITY_F_PER_CM,
} from './constants';
import { InversionError } from '../errors';
import { checkPositive, DOPING, INTRINSIC, PERMITTIVITY, TEMPERATURE } from './estimate';

export interface AbruptJunctionInput {
  acceptorsPerCm3: number;
  donorsPerCm3: number;
  intrinsicPerCm3: number;
  relativePermittivity: number;
  temperatureK: number;
  /** Reverse bias, V; 0 when left out. */
  reverseBiasV?: number;
}

export interface AbruptJunction {
  builtInV: number;
  widthNm: number;
  /** Share of the width on the n and on the p side, nm. */
  nSideNm: number;
  pSideNm: number;
  maximumFieldVPerCm: number;
}

/**
 * Abrupt p-n junction in the depletion approximation (Neamen, sections 7.1 to 7.3; Sze, section 2.2.1):
 * V_bi = kT·ln(N_a N_d/n_i²), W = √(2ε(V_bi + V_R)(N_a + N_d)/(q N_a N_d)), x_n = W·N_a/(N_a + N_d), x_p = W − x_n,
 * E_max = q N_d x_n/ε.
 *
 * @throws InversionError for anything that is not a positive number, a reverse bias below 0, or no barrier (N_a N_d ≤ n_i²).
 */
export function abruptJunction(input: AbruptJunctionInput): AbruptJunction {
  const { acceptorsPerCm3: acceptors, donorsPerCm3: donors, reverseBiasV = 0 } = input;
  checkPositive(acceptors, DOPING);
  checkPositive(donors, DOPING);
  checkPositive(input.intrinsicPerCm3, INTRINSIC);
  checkPositive(input.relativePermittivity, PERMITTIVITY);
  checkPositive(input.temperatureK, TEMPERATURE);
  if (!(reverseBiasV >= 0 && Number.isFinite(reverseBiasV))) {
    throw new InversionError('bad-bias', `The reverse bias cannot be ${reverseBiasV} V.`);
  }
  const kT = BOLTZMANN_EV_PER_K * input.temperatureK;
  const builtInV =
    kT * (Math.log(acceptors / input.intrinsicPerCm3) + Math.log(donors / input.intrinsicPerCm3));
  if (!(builtInV > 0)) {
    throw new InversionError(
      'no-barrier',
      'A junction needs doping above the intrinsic concentration.',
    );
  }
  const epsilonPerCharge =
    (input.relativePermittivity * VACUUM_PERMITTIVITY_F_PER_CM) / ELEMENTARY_CHARGE_C;
  const widthCm = Math.sqrt(
    2 * epsilonPerCharge * (builtInV + reverseBiasV) * (1 / acceptors + 1 / donors),
  );
  const nSideCm = widthCm / (1 + donors / acceptors);
  const pSideCm = widthCm / (1 + acceptors / donors);
  return {
    builtInV,
    widthNm: widthCm * NM_PER_CM,
    nSideNm: nSideCm * NM_PER_CM,
    pSideNm: pSideCm * NM_PER_CM,
    maximumFieldVPerCm: (donors * nSideCm) / epsilonPerCharge,
  };
}
