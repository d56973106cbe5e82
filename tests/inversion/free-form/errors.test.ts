import { describe, expect, it } from 'vitest';
import {
  freeFormAt,
  freeFormBands,
  InversionError,
  prepareFreeForm,
  resampleFreeForm,
  solveFreeForm,
  type FreeFormInput,
} from '@/lib/inversion/index';
import { free, heldAt } from '../support/scans';
import { freeFraction, freeRate, LEVELS } from './support/inputs';

function codeOf(run: () => unknown): string {
  try {
    run();
  } catch (error) {
    if (error instanceof InversionError) return error.code;
    throw error;
  }
  return 'none';
}

const rate = freeRate();
const fraction = freeFraction();
const off = (count: number): FreeFormInput['points'] =>
  rate.points.map((point, i) => ({ ...point, enabled: i >= count }));
const saturating = {
  kind: 'saturating-fraction',
  halfPerCm3: 1e15,
  halfSigmaPerCm3: null,
} as const;

const wrong: readonly [string, FreeFormInput][] = [
  ['empty-scan', { ...rate, points: [] }],
  ['empty-scan', { ...rate, points: off(13) }],
  ['too-few-points', { ...rate, points: off(12) }],
  ['too-few-points', { ...rate, difference: 2, points: off(11) }],
  ['bad-value', { ...rate, points: rate.points.map((p) => ({ ...p, value: NaN })) }],
  ['bad-sigma', { ...rate, points: rate.points.map((p) => ({ ...p, sigma: 0 })) }],
  ['wrong-response', { ...rate, response: { kind: 'two-level' } }],
  ['bad-cap', { ...rate, capThicknessNm: -1 }],
  ['cap-too-thick', { ...rate, capThicknessNm: 300 }],
  ['bad-difference', { ...rate, difference: 3 as 2 }],
  ['bad-monotonic', { ...rate, monotonic: 'up' as 'no' }],
  ['bad-knot-count', { ...rate, knotCount: 1 }],
  ['bad-knot-count', { ...rate, knotCount: 12.5 }],
  ['bad-knot-count', { ...rate, knotCount: 100_000 }],
  ['bad-knot-count', { ...rate, difference: 2, knotsNm: [0, 10] }],
  ['bad-knots', { ...rate, knotsNm: [0, 10, 10, 40] }],
  ['bad-knots', { ...rate, knotsNm: [-1, 10, 40] }],
  ['bad-knots', { ...rate, knotsNm: [0, NaN, 40] }],
  ['bad-knots', { ...rate, knotsNm: [400, 500, 600] }],
  ['bad-reference', { ...rate, reference: [1, 2, 3] }],
  ['bad-reference', { ...rate, reference: new Array<number>(40).fill(NaN) }],
  ['bad-covariance', { ...rate, covariance: [[1]] }],
  ['levels-not-held', { ...fraction, parameters: {} }],
  ['levels-not-held', { ...fraction, parameters: { ...LEVELS, levelTop: free } }],
  ['no-contrast', { ...fraction, parameters: { levelTop: heldAt(0.5), levelBulk: heldAt(0.5) } }],
  ['held-out-of-bounds', { ...fraction, parameters: { ...LEVELS, levelTop: heldAt(1.2) } }],
  [
    'no-held-value',
    { ...fraction, parameters: { ...LEVELS, levelTop: { held: true, value: null, prior: null } } },
  ],
  ['held-out-of-bounds', { ...rate, parameters: { depthScale: heldAt(5) } }],
  ['no-bulk-concentration', { ...fraction, response: saturating }],
];

describe('a free-form input that cannot be started from', () => {
  it.each(wrong)('is refused by name: %s', (code, input) => {
    expect(codeOf(() => prepareFreeForm(input))).toBe(code);
  });

  it('is refused for a strength that is not positive, and for blocks and rows that are not whole', () => {
    const prepared = prepareFreeForm(rate);
    for (const strength of [0, -1, NaN, Infinity]) {
      expect(codeOf(() => freeFormAt(prepared, strength))).toBe('bad-strength');
      expect(codeOf(() => solveFreeForm(prepared, { strengths: [1, 2, strength] }))).toBe(
        'bad-strength',
      );
      expect(codeOf(() => solveFreeForm(prepared, { strength }))).toBe('bad-strength');
    }
    expect(codeOf(() => solveFreeForm(prepared, { strengths: [1] }))).toBe('too-few-strengths');
    const solution = freeFormAt(prepared, 10);
    expect(
      codeOf(() => resampleFreeForm(prepared, solution, { seed: 1, first: -1, count: 2 })),
    ).toBe('bad-block');
    expect(codeOf(() => freeFormBands(prepared, new Float64Array(40), [1]))).toBe('bad-rows');
    expect(codeOf(() => freeFormBands(prepared, new Float64Array(81), [1]))).toBe('bad-rows');
  });
});
