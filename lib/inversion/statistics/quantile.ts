/** Tail shares of the two-sided 68.27 % and 95 % bands. */
export const TAIL_68 = 0.15865525393145707;
export const TAIL_95 = 0.025;

/** Quantile of sorted numbers, linear between order statistics. */
export function quantileOf(sorted: Float64Array, share: number): number {
  const at = share * (sorted.length - 1);
  const below = Math.floor(at);
  const above = Math.min(below + 1, sorted.length - 1);
  return sorted[below]! + (at - below) * (sorted[above]! - sorted[below]!);
}
