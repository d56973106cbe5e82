import { BOLTZMANN_J_PER_K, ELECTRON_MASS_KG } from '../electrostatics/constants';
import { checkEstimate, powerLaw, TEMPERATURE, type Estimate } from '../electrostatics/estimate';

export interface CaptureCoefficientInput {
  /** σ_c, cm². */
  crossSectionCm2: Estimate;
  /** m over the electron mass: MATERIALS lists one for electrons and holes. */
  effectiveMass: Estimate;
  temperatureK: Estimate;
}

const CM_PER_M = 100;
/** √(8k/(π m_e)), cm s⁻¹ K^(−1/2). */
const SPEED = Math.sqrt((8 * BOLTZMANN_J_PER_K) / (Math.PI * ELECTRON_MASS_KG)) * CM_PER_M;

/**
 * v_th = √(8kT/(π m*)), cm/s: the mean speed of a Maxwell distribution (Reif, Fundamentals of Statistical and Thermal Physics,
 * section 7.10); independent uncertainties to first order.
 *
 * @throws InversionError for anything that is not a positive number.
 */
export function thermalVelocity(
  input: Pick<CaptureCoefficientInput, 'effectiveMass' | 'temperatureK'>,
): Estimate {
  checkEstimate(input.effectiveMass, { name: 'effective mass', unit: 'electron masses' });
  checkEstimate(input.temperatureK, TEMPERATURE);
  return powerLaw(SPEED, [
    [input.temperatureK, 0.5],
    [input.effectiveMass, -0.5],
  ]);
}

/**
 * γ = σ_c·v_th, cm³ s⁻¹, for a response of kind 'capture-rate'; independent uncertainties to first order.
 *
 * @throws InversionError for anything that is not a positive number.
 */
export function captureCoefficient(input: CaptureCoefficientInput): Estimate {
  checkEstimate(input.crossSectionCm2, { name: 'capture cross-section', unit: 'cm²' });
  return powerLaw(1, [
    [input.crossSectionCm2, 1],
    [thermalVelocity(input), 1],
  ]);
}
