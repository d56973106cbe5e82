import { simulateScan, type FitInput, type FreeFormInput } from '@/lib/inversion/index';
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

/** The edge of the simulated scans. */
export const EDGE = { edgeDepthNm: 70, edgeWidthNm: 12 };
export const EDGE_LEVELS = { ...EDGE, levelTop: 0.74, levelBulk: 0.32 };

/** A simulated scan of fractions over that edge, its levels held. */
export const scanOf = (seed: number, change: Partial<FreeFormInput> = {}): FreeFormInput =>
  freeFraction({
    ...change,
    points: simulateScan({ input: fractionInput({}, 0.005), values: EDGE_LEVELS, seed }),
  });

/**
 * The share of that edge, ½ erfc((W − x)/(√2 w)) by Simpson's rule on the normal density: an integral of its own, good to 1e-10
 * here.
 */
export function edgeShare(x: number): number {
  const z = (x - EDGE.edgeDepthNm) / EDGE.edgeWidthNm;
  const end = Math.max(-9, Math.min(9, z));
  const n = 400;
  let sum = 0;
  for (let k = 0; k <= n; k++) {
    const t = (end * k) / n;
    sum += (k === 0 || k === n ? 1 : k % 2 ? 4 : 2) * Math.exp((-t * t) / 2);
  }
  return 0.5 + (sum * end) / (3 * n) / Math.sqrt(2 * Math.PI);
}
