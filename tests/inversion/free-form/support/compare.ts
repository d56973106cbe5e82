/** Largest difference over the largest value. */
export function largestDifference(values: ArrayLike<number>, reference: ArrayLike<number>): number {
  if (values.length !== reference.length) return Infinity;
  let difference = 0;
  let size = 0;
  for (let j = 0; j < values.length; j++) {
    difference = Math.max(difference, Math.abs(values[j]! - reference[j]!));
    size = Math.max(size, Math.abs(reference[j]!));
  }
  return difference / size;
}
