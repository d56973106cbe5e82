import type { Model } from './model';

/** Widths to leave zero by, as shares of the range: the first is about a bin of a usual stopping file. */
export const OPENED_WIDTHS = [0.006, 0.02, 0.06] as const;

/**
 * At width zero the derivative by the width vanishes, so a polish that arrives there, or begins there, never leaves again.
 * Sets every free width that is zero to a small one.
 */
export function openWidths({ widths, upper }: Model, theta: Float64Array, held: Uint8Array): void {
  for (const k of widths) {
    if (held[k] || theta[k]! > 0) continue;
    theta[k] = OPENED_WIDTHS[0] * upper[k]!;
  }
}
