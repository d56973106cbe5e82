import { checkPositive, TEMPERATURE } from './estimate';
import type { Semiconductor } from './semiconductor';

/**
 * E_g(T) = E_g(0) − α·T²/(T + β), eV (Varshni, Physica 34, 149 (1967), equation 1).
 *
 * @throws InversionError for a temperature that is not a positive number.
 */
export function gapEv({ gap }: Semiconductor, temperatureK: number): number {
  checkPositive(temperatureK, TEMPERATURE);
  return (
    gap.atZeroEv.value -
    (gap.alphaEvPerK.value * temperatureK * temperatureK) / (temperatureK + gap.betaK.value)
  );
}

/** dE_g/dT = −α·T(T + 2β)/(T + β)², eV/K. */
export function gapSlopeEvPerK({ gap }: Semiconductor, temperatureK: number): number {
  const beta = gap.betaK.value;
  const sum = temperatureK + beta;
  return (-gap.alphaEvPerK.value * temperatureK * (temperatureK + 2 * beta)) / (sum * sum);
}
