import { InversionError } from '../errors';

/** Rows first … first + count − 1 of a seeded run: row r depends on (seed, r) alone, so that threads may share a run in any way. */
export interface SeededBlock {
  seed: number;
  first: number;
  count: number;
}

/** @throws InversionError 'bad-block' for a seed, first or count that is not a whole number ≥ 0. */
export function checkBlock({ seed, first, count }: SeededBlock): void {
  for (const [name, value] of Object.entries({ seed, first, count })) {
    if (Number.isSafeInteger(value) && value >= 0) continue;
    throw new InversionError(
      'bad-block',
      `A block of simulated scans needs a whole ${name} of 0 or more, not ${value}.`,
    );
  }
}
