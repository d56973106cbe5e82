import type { ChargeCycle } from './charge-cycle';
import type { RateAndSlopes } from './rate-and-slopes';
import { secularFunction } from './secular-function';

/** One eigenvalue μ of the exchange matrix. */
export interface ExchangeMode extends RateAndSlopes {
  /** Im μ: shift of the line, rad/µs; ratePerUs is −Re μ. */
  shiftPerUs: number;
  /** |1/f′(μ)|: how much of the diamagnetic signal decays in this mode. */
  amplitude: number;
}

const MOST_STEPS = 60;
/** A Newton step below this share of |μ| is rounding. */
const ROUNDING = 4e-16;

/**
 * Newton steps on f(μ) = 0 from a guess until they are rounding, with the derivatives of the decay rate from
 * dμ/dΛ = −(∂f/∂Λ)/f′.
 *
 * @returns null where the steps do not settle.
 */
export function polishMode(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
  guessRe: number,
  guessIm: number,
): ExchangeMode | null {
  let re = guessRe;
  let im = guessIm;
  let last = Infinity;
  for (let k = 0; k < MOST_STEPS; k++) {
    const f = secularFunction(cycle, capturePerUs, ionisationPerUs, re, im);
    const square = f.slopeRe * f.slopeRe + f.slopeIm * f.slopeIm;
    const stepRe = (f.valueRe * f.slopeRe + f.valueIm * f.slopeIm) / square;
    const stepIm = (f.valueIm * f.slopeRe - f.valueRe * f.slopeIm) / square;
    re -= stepRe;
    im -= stepIm;
    const share = Math.hypot(stepRe, stepIm) / Math.hypot(re, im);
    if (!Number.isFinite(share)) return null;
    // Quadratic until rounding takes over: then the steps no longer shrink.
    if (share <= ROUNDING || (share < 1e-12 && share >= last)) {
      return modeAt(cycle, capturePerUs, ionisationPerUs, re, im);
    }
    last = share;
  }
  return null;
}

function modeAt(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
  re: number,
  im: number,
): ExchangeMode {
  const f = secularFunction(cycle, capturePerUs, ionisationPerUs, re, im);
  const square = f.slopeRe * f.slopeRe + f.slopeIm * f.slopeIm;
  return {
    ratePerUs: -re,
    shiftPerUs: im,
    amplitude: 1 / Math.sqrt(square),
    byCapture: (f.captureRe * f.slopeRe + f.captureIm * f.slopeIm) / square,
    byIonisation: (f.ionisationRe * f.slopeRe + f.ionisationIm * f.slopeIm) / square,
  };
}
