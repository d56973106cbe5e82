import { depletionWidthNm } from './depletion-width';
import type { Estimate } from './estimate';
import { fermiPotential, type FermiPotentialInput } from './fermi-potential';

/**
 * x_dT = √(2 ε (2φ_F)/(q N)), nm: the width at which strong inversion begins and depletion stops growing (Neamen,
 * section 10.1, equation 10.6). σ to first order with N, n_i, T and ε_r independent; N enters twice, through φ_F and
 * directly, and is followed through both: d ln W/dN = (dφ_F/dN/φ_F − 1/N)/2.
 *
 * @throws InversionError for anything that is not a positive number.
 */
export function maximumDepletionWidthNm(
  input: FermiPotentialInput & { relativePermittivity: Estimate },
): Estimate {
  const { dopingPerCm3, relativePermittivity } = input;
  const exact = { value: dopingPerCm3.value, sigma: 0 };
  // The share of σ that does not come from N, then the share that does.
  const potential = fermiPotential({ ...input, dopingPerCm3: exact });
  const twice = { value: 2 * potential.value, sigma: 2 * potential.sigma };
  const width = depletionWidthNm({
    bandBendingEv: twice,
    dopingPerCm3: exact,
    relativePermittivity,
  });
  const withDoping = fermiPotential({
    ...input,
    temperatureK: { ...input.temperatureK, sigma: 0 },
    intrinsicPerCm3: { ...input.intrinsicPerCm3, sigma: 0 },
  });
  const fromDoping =
    (width.value / 2) *
    Math.abs(withDoping.sigma / withDoping.value - dopingPerCm3.sigma / dopingPerCm3.value);
  return { value: width.value, sigma: Math.hypot(width.sigma, fromDoping) };
}
