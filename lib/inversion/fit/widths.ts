import type { Model } from './model';

/** Width to open one by, as a share of the range: about a bin of a usual stopping file. */
const OPENED_WIDTH = 0.006;
const WIDER = [0.02, 0.06];
/** A probe that bends the share sees an edge far in front of itself, and there is room for a small width only. */
const CLOSER = [0.0003, 0.0012];

/** Widths to leave zero by, as shares of the range. */
export function openings({ trial }: Pick<Model, 'trial'>): readonly number[] {
  return trial.crooked ? CROOKED : STRAIGHT;
}

const STRAIGHT = [OPENED_WIDTH, ...WIDER];
const CROOKED = [...CLOSER, ...STRAIGHT];

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
