import type { Model } from './model';

/** Width to open one by, as a share of the range: about a bin of a usual stopping file. */
const OPENED_WIDTH = 0.006;
/** Widths to leave zero by: an edge that the probe sees far in front of itself has room for a small one only. */
export const OPENED_WIDTHS = [0.0003, 0.0012, OPENED_WIDTH, 0.02, 0.06] as const;

/**
 * At width zero the derivative by the width vanishes, so a polish that arrives there, or begins there, never leaves again.
 * Sets every free width that is zero to a small one.
 */
export function openWidths({ widths, upper }: Model, theta: Float64Array, held: Uint8Array): void {
  for (const k of widths) {
    if (held[k] || theta[k]! > 0) continue;
    theta[k] = OPENED_WIDTH * upper[k]!;
  }
}
