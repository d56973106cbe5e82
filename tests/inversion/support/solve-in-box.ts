export interface Box {
  lower: readonly number[];
  upper: readonly number[];
  /** Value of a held unknown, null where it is free. */
  held: readonly (number | null)[];
}

/** A pivot this small is rounding: the unknown is not determined, and any value does. */
const SINGULAR = 1e-13;

/**
 * Minimum of cᵀGc − 2hᵀc in a box. Where the free minimum lies outside, the best point of the box lies on one of the sides that it
 * lies beyond (Φ falls all the way from there to the free minimum), so that side is held and the rest solved again.
 */
export function solveInBox(
  gram: readonly number[][],
  right: readonly number[],
  box: Box,
): number[] {
  const c = solveFree(gram, right, box);
  let best: number[] | null = null;
  let lowest = Infinity;
  c.forEach((value, k) => {
    if (box.held[k] !== null || (value >= box.lower[k]! && value <= box.upper[k]!)) return;
    const side = value < box.lower[k]! ? box.lower[k]! : box.upper[k]!;
    const held = box.held.map((before, l) => (l === k ? side : before));
    const found = solveInBox(gram, right, { ...box, held });
    const height = heightOf(gram, right, found);
    if (height >= lowest) return;
    best = found;
    lowest = height;
  });
  return best ?? c;
}

function solveFree(
  gram: readonly number[][],
  right: readonly number[],
  { lower, held }: Box,
): number[] {
  const c = held.map((value) => value ?? NaN);
  const free = c.map((_, k) => k).filter((k) => held[k] === null);
  const rows = free.map((k) => [
    ...free.map((l) => gram[k]![l]!),
    held.reduce<number>(
      (sum, value, l) => (value === null ? sum : sum - gram[k]![l]! * value),
      right[k]!,
    ),
  ]);
  const m = free.length;
  free.forEach((k, a) => {
    if (!(rows[a]![a]! > SINGULAR * gram[k]![k]!)) return;
    for (let b = a + 1; b < m; b++) {
      const factor = rows[b]![a]! / rows[a]![a]!;
      for (let j = a; j <= m; j++) rows[b]![j]! -= factor * rows[a]![j]!;
    }
  });
  for (let a = m - 1; a >= 0; a--) {
    const k = free[a]!;
    if (!(rows[a]![a]! > SINGULAR * gram[k]![k]!)) {
      c[k] = lower[k]!;
      continue;
    }
    let value = rows[a]![m]!;
    for (let b = a + 1; b < m; b++) value -= rows[a]![b]! * c[free[b]!]!;
    c[k] = value / rows[a]![a]!;
  }
  return c;
}

function heightOf(
  gram: readonly number[][],
  right: readonly number[],
  c: readonly number[],
): number {
  let sum = 0;
  c.forEach((value, k) => {
    sum -= 2 * right[k]! * value;
    c.forEach((other, l) => (sum += gram[k]![l]! * value * other));
  });
  return sum;
}
