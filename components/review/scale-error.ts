import { withDecimals } from '@/lib/format';
import type { FitSpec } from '@/lib/schemas/fit';

/** An uncertainty that moves the whole profile up or down and is no part of its bands. */
export interface ScaleError {
  /** σ over value. */
  relative: number;
  sentence: string;
}

/** The capture coefficient of a rate, or the bulk concentration given to a fraction, where it has a σ. */
export function scaleErrorOf({ response, carriers }: FitSpec): ScaleError | null {
  if (response.kind === 'capture-rate') {
    return said(response.gammaCm3PerS, response.gammaSigmaCm3PerS, 'the capture coefficient');
  }
  return said(carriers.bulkPerCm3, carriers.bulkSigmaPerCm3, 'the bulk concentration');
}

function said(value: number | null, sigma: number | null, what: string): ScaleError | null {
  if (value === null || sigma === null || sigma === 0) return null;
  const relative = sigma / value;
  const percent = withDecimals(100 * relative, relative < 0.01 ? 2 : 0);
  return {
    relative,
    sentence: `Besides the bands, the uncertainty of ${what} (±${percent} %) moves the whole profile.`,
  };
}

/** The same for the bar beside a profile, which speaks of the capture coefficient alone. */
export function captureScaleError(spec: FitSpec): number | null {
  return spec.response.kind === 'capture-rate' ? (scaleErrorOf(spec)?.relative ?? null) : null;
}
