import { BOLTZMANN_EV_PER_K } from '../electrostatics/constants';

/** k, meV/K. */
export const BOLTZMANN_MEV_PER_K = 1000 * BOLTZMANN_EV_PER_K;

/** Λ_i(T) = ν·exp(−E_A/kT), µs⁻¹ (Arrhenius). */
export function ionisationPerUs(
  attemptPerUs: number,
  activationMeV: number,
  temperatureK: number,
): number {
  return attemptPerUs * Math.exp(-activationMeV / (BOLTZMANN_MEV_PER_K * temperatureK));
}
