import { BOLTZMANN_EV_PER_K } from './constants';
import { checkEstimate, DOPING, INTRINSIC, TEMPERATURE, type Estimate } from './estimate';

export interface FermiPotentialInput {
  /** Net ionised doping |N_a − N_d|, cm⁻³. */
  dopingPerCm3: Estimate;
  /** n_i at this temperature, cm⁻³. */
  intrinsicPerCm3: Estimate;
  temperatureK: Estimate;
}

/**
 * φ_F = kT·arsinh(N/2n_i), eV: distance of the Fermi level from the middle level in the neutral bulk, from neutrality
 * p − n = N and p·n = n_i². For N ≫ n_i it is the textbook's kT·ln(N/n_i) (Sze, section 1.4.2; Neamen, section 10.1).
 *
 * σ to first order; N, n_i and T are taken as independent, so give n_i with the uncertainty of its material numbers only
 * or T with σ = 0 when n_i was computed from the same T.
 *
 * @throws InversionError for anything that is not a positive number.
 */
export function fermiPotential(input: FermiPotentialInput): Estimate {
  const { dopingPerCm3: doping, intrinsicPerCm3: intrinsic, temperatureK } = input;
  checkEstimate(doping, DOPING);
  checkEstimate(intrinsic, INTRINSIC);
  checkEstimate(temperatureK, TEMPERATURE);
  const kT = BOLTZMANN_EV_PER_K * temperatureK.value;
  const value = kT * Math.asinh(doping.value / (2 * intrinsic.value));
  const root = Math.hypot(doping.value, 2 * intrinsic.value);
  const sigma = Math.hypot(
    (kT * doping.sigma) / root,
    (kT * doping.value * intrinsic.sigma) / (intrinsic.value * root),
    (value * temperatureK.sigma) / temperatureK.value,
  );
  return { value, sigma };
}
