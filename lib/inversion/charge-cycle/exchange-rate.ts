import type { ChargeCycle } from './charge-cycle';
import { InversionError } from '../errors';
import { dephasedShare } from './closed-form-rate';
import { exchangeModes } from './exchange-matrix';
import { polishMode, type ExchangeMode } from './polish-mode';
import type { RateAndSlopes } from './rate-and-slopes';
import { secularFunction } from './secular-function';

/** A mode that holds more than this of the diamagnetic signal is taken without looking at the others. */
const DOMINANT = 0.5;

/**
 * Decay rate of the diamagnetic line from the exchange matrix, to any order in Λ_c, µs⁻¹, without λ₀: the mode that holds
 * the largest share of the diamagnetic signal. Wherever ionisation is faster than capture that is the slowest mode; where
 * it is slower, the slowest mode belongs to muonium that has not been ionised and would not be seen at the diamagnetic
 * frequency. Newton steps on the characteristic equation from the closed form; all five modes where that is not clear-cut.
 *
 * @throws InversionError for an ionisation rate that is not positive or a negative capture rate.
 */
export function exchangeRate(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
): RateAndSlopes {
  if (capturePerUs === 0) {
    const share = dephasedShare(cycle, ionisationPerUs);
    return { ratePerUs: 0, byCapture: share, byIonisation: 0 };
  }
  return diamagneticMode(cycle, capturePerUs, ionisationPerUs);
}

/** The mode that exchangeRate takes, Λ_c > 0. */
export function diamagneticMode(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
): ExchangeMode {
  const { captureRe, captureIm } = secularFunction(cycle, capturePerUs, ionisationPerUs, 0, 0);
  const near = polishMode(
    cycle,
    capturePerUs,
    ionisationPerUs,
    -capturePerUs * captureRe,
    -capturePerUs * captureIm,
  );
  if (near && near.amplitude > DOMINANT && near.ratePerUs > 0) return near;
  const modes = exchangeModes(cycle, capturePerUs, ionisationPerUs);
  const [first, ...rest] = modes;
  if (!first) {
    throw new InversionError(
      'no-mode',
      `The exchange matrix has no usable mode at a capture rate of ${capturePerUs} and an ionisation rate of ${ionisationPerUs} µs⁻¹.`,
    );
  }
  return rest.reduce((best, mode) => (mode.amplitude > best.amplitude ? mode : best), first);
}
