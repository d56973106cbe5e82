import type { Model } from './model';

/** A width to begin a polish with, as a share of its range: below the bins of any stopping file that shows it. */
const OPENED = 0.006;

/**
 * At width zero the derivative by the width vanishes, so a polish that arrives there, or begins there, never leaves again.
 * Sets every free width that is zero to a small one.
 */
export function openWidths({ trial, upper }: Model, theta: Float64Array, held: Uint8Array): void {
  for (const k of trial.widths) {
    if (held[k] || theta[k]! > 0) continue;
    theta[k] = OPENED * upper[k]!;
  }
}
