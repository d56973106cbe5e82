const MOST_DECADES = 6;
/** Beyond these a power of ten next to the value would be 0 or infinite. */
const [SMALLEST, LARGEST] = [1e-290, 1e290];

/**
 * [low, high] for a logarithmic axis: whole decades round the positive values, at most six of them.
 * Zeros and negative values are left out, so the axis never gets one; they are drawn below `low`.
 * With a `floor`, under which the scan cannot tell values apart, the axis ends a decade below it.
 */
export function logDomain(
  values: Iterable<number | null>,
  floor: number | null = null,
): [number, number] {
  let least = Infinity;
  let most = 0;
  for (const value of values) {
    if (value === null || !(value > SMALLEST && value < LARGEST)) continue;
    least = Math.min(least, value);
    most = Math.max(most, value);
  }
  if (most === 0) return [1, 10];
  const high = Math.ceil(Math.log10(most * 1.2));
  const least10 = Math.floor(Math.log10(least));
  const wanted = floor !== null && floor > 0 ? Math.floor(Math.log10(floor)) - 1 : least10;
  const low = Math.max(high - MOST_DECADES, wanted);
  return [10 ** Math.min(low, high - 2), 10 ** high];
}

/** Powers of ten inside a log domain, thinned to at most `most` of them. */
export function decades([low, high]: readonly [number, number], most = 7): number[] {
  const first = Math.round(Math.log10(low));
  const last = Math.round(Math.log10(high));
  const step = Math.max(1, Math.ceil((last - first + 1) / most));
  return Array.from({ length: Math.floor((last - first) / step) + 1 }, (_, i) => first + i * step);
}
