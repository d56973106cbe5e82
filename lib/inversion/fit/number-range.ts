/** Far beyond anything measured, and far enough from the ends of a double that squares and ratios stay finite. */
const LARGEST = 1e50;

/** A finite number that can be reckoned with. */
export function isNumber(value: number): boolean {
  return Math.abs(value) <= LARGEST;
}

/** The same, and positive. */
export function isPositive(value: number): boolean {
  return value >= 1 / LARGEST && value <= LARGEST;
}

/** The same, or zero. */
export function isPositiveOrZero(value: number): boolean {
  return value === 0 || isPositive(value);
}
