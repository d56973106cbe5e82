import type { ResampleBlock } from './protocol';

/** Rows in one request: small enough that progress and a stop come often, large enough that messages cost nothing. */
export const BLOCK_ROWS = 25;

/** Splits `count` rows into blocks in ascending order; the last may be shorter. */
export function splitIntoBlocks(count: number, seed: number, rows = BLOCK_ROWS): ResampleBlock[] {
  return Array.from({ length: Math.ceil(count / rows) }, (_, index) => ({
    seed,
    first: index * rows,
    count: Math.min(rows, count - index * rows),
  }));
}

/**
 * Puts blocks back in the order of their rows, whatever order they came in. All rows are equally
 * wide; throws when a block is missing or of another width.
 */
export function mergeBlocks(
  parts: readonly { first: number; count: number; rows: Float64Array }[],
  count: number,
): Float64Array {
  const width = parts[0] ? parts[0].rows.length / parts[0].count : 0;
  const merged = new Float64Array(count * width);
  let filled = 0;
  for (const part of parts) {
    if (part.rows.length !== part.count * width)
      throw new RangeError(`Block at row ${part.first} is not ${width} wide.`);
    merged.set(part.rows, part.first * width);
    filled += part.count;
  }
  if (filled !== count) throw new RangeError(`${filled} of ${count} rows came back.`);
  return merged;
}
