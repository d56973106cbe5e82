import { BOLTZMANN_EV_PER_K } from './constants';
import { checkEstimate, TEMPERATURE, type Estimate } from './estimate';
import { gapEv, gapSlopeEvPerK } from './gap';
import { checkSemiconductor, type Semiconductor, type Sourced } from './semiconductor';

export interface IntrinsicConcentration extends Estimate {
  /** ln(n_i/cm⁻³): still a number where n_i itself underflows (wide gaps, low temperatures). */
  log: number;
}

/**
 * n_i(T) = √(N_c N_v)·(T/300 K)^(3/2)·exp(−E_g(T)/2kT), cm⁻³ (Sze, Physics of Semiconductor Devices, section 1.4.1).
 * Boltzmann statistics, no narrowing of the gap by doping.
 *
 * σ to first order from the temperature, N_c, N_v and E_g(0), taken as independent; a material number without a σ counts
 * as exact: (σ/n_i)² = ((3/2 + E_g/2kT)/T − E_g′/2kT)²σ_T² + (σ_Nc/2N_c)² + (σ_Nv/2N_v)² + (σ_Eg/2kT)².
 *
 * @throws InversionError for a material that cannot be or a temperature that is not a positive number.
 */
export function intrinsicConcentration(
  material: Semiconductor,
  temperatureK: Estimate,
): IntrinsicConcentration {
  checkSemiconductor(material);
  checkEstimate(temperatureK, TEMPERATURE);
  const { conductionStatesPerCm3: conduction, valenceStatesPerCm3: valence, gap } = material;
  const t = temperatureK.value;
  const kT = BOLTZMANN_EV_PER_K * t;
  const gapAtT = gapEv(material, t);
  const log =
    0.5 * Math.log(conduction.value) +
    0.5 * Math.log(valence.value) +
    1.5 * Math.log(t / 300) -
    gapAtT / (2 * kT);
  const slope = (1.5 + gapAtT / (2 * kT)) / t - gapSlopeEvPerK(material, t) / (2 * kT);
  const relative = Math.hypot(
    slope * temperatureK.sigma,
    relativeSigma(conduction) / 2,
    relativeSigma(valence) / 2,
    (gap.atZeroEv.sigma ?? 0) / (2 * kT),
  );
  const value = Math.exp(log);
  return { value, sigma: value * relative, log };
}

function relativeSigma({ value, sigma }: Sourced): number {
  return (sigma ?? 0) / value;
}
