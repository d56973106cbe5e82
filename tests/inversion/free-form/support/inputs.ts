import type { FitInput, FreeFormInput } from '@/lib/inversion/index';
import { fractionInput, heldAt, rateInput } from '../../support/scans';

/** A scan of rates, first differences, no monotony, unless changed. */
export function freeRate(change: Partial<FreeFormInput> = {}, sigma = 0.05): FreeFormInput {
  return { ...rateInput({}, sigma), difference: 1, monotonic: 'no', ...change };
}

export const LEVELS: FitInput['parameters'] = { levelTop: heldAt(0.74), levelBulk: heldAt(0.32) };

/** A scan of fractions with both levels held. */
export function freeFraction(change: Partial<FreeFormInput> = {}, sigma = 0.005): FreeFormInput {
  return {
    ...fractionInput({}, sigma),
    parameters: LEVELS,
    difference: 1,
    monotonic: 'no',
    ...change,
  };
}

export function withValues(input: FreeFormInput, values: ArrayLike<number>): FreeFormInput {
  return { ...input, points: input.points.map((point, i) => ({ ...point, value: values[i]! })) };
}
