import { InversionError } from '../errors';
import { normalStream } from '../statistics/random';
import { chargeCycle } from './charge-cycle';
import { checkNumber } from './check-cycle';
import { exchangeRate } from './exchange-rate';
import { ionisationPerUs } from './ionisation-rate';
import type { TemperatureScan } from './joint-fit-input';

export interface TemperatureScanTruth {
  hyperfineMHz: number;
  fieldMt: number;
  attemptPerUs: number;
  baselinePerUs: number;
  /** One entry per implantation energy. */
  energies: readonly { energyKeV: number; capturePerUs: number; activationMeV: number }[];
  temperaturesK: readonly number[];
  /** σ of every rate, µs⁻¹. */
  sigma: number;
  seed: number;
}

/**
 * Temperature scans that a charge cycle would give, by the exchange matrix itself, with seeded Gaussian noise.
 *
 * @throws InversionError for numbers that cannot be, no energies or no temperatures.
 */
export function simulateTemperatureScans(truth: TemperatureScanTruth): TemperatureScan[] {
  checkNumber(truth.attemptPerUs, 'attempt frequency', 'µs⁻¹');
  checkNumber(truth.baselinePerUs, 'background rate', 'µs⁻¹', true);
  checkNumber(truth.sigma, 'uncertainty of a rate', 'µs⁻¹');
  if (truth.energies.length === 0 || truth.temperaturesK.length === 0) {
    throw new InversionError('empty-series', 'A series needs energies and temperatures.');
  }
  const cycle = chargeCycle(truth.hyperfineMHz, truth.fieldMt);
  return truth.energies.map(({ energyKeV, capturePerUs, activationMeV }, scan) => {
    checkNumber(energyKeV, 'implantation energy', 'keV');
    checkNumber(capturePerUs, 'capture rate', 'µs⁻¹', true);
    checkNumber(activationMeV, 'activation energy', 'meV');
    const noise = normalStream(truth.seed, scan);
    const points = truth.temperaturesK.map((temperatureK) => {
      checkNumber(temperatureK, 'temperature', 'K');
      const ionisation = ionisationPerUs(truth.attemptPerUs, activationMeV, temperatureK);
      const { ratePerUs } = exchangeRate(cycle, capturePerUs, ionisation);
      return {
        temperatureK,
        ratePerUs: truth.baselinePerUs + ratePerUs + truth.sigma * noise(),
        sigma: truth.sigma,
        enabled: true,
      };
    });
    return { energyKeV, points };
  });
}
