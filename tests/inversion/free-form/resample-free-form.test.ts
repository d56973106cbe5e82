import { describe, expect, it } from 'vitest';
import {
  freeFormAt,
  freeFormBands,
  prepareFreeForm,
  resampleFreeForm,
  solveFreeForm,
  type FreeFormInput,
} from '@/lib/inversion/index';
import { freeWith } from '../support/scans';
import { freeRate, LEVELS, scanOf } from './support/inputs';

describe('the resamples of a free-form profile', () => {
  const free = { ...LEVELS, depthScale: freeWith(1, 0.05) };

  it('depend on the seed and the row alone, and leave the solution as it was', () => {
    for (const parameters of [LEVELS, free]) {
      const prepared = prepareFreeForm(scanOf(6, { parameters, capThicknessNm: 3 }));
      const answer = solveFreeForm(prepared);
      const whole = resampleFreeForm(prepared, answer, { seed: 77, first: 0, count: 8 });
      const parts = [0, 5].map((first) =>
        resampleFreeForm(prepared, answer, { seed: 77, first, count: first ? 3 : 5 }),
      );
      expect([...parts[0]!, ...parts[1]!]).toEqual([...whole]);
      expect(freeFormAt(prepared, answer.strength).residuals).toEqual(answer.residuals);
      expect(resampleFreeForm(prepared, answer, { seed: 78, first: 0, count: 8 })).not.toEqual(
        whole,
      );
    }
  });

  // Without constraint at work (a share well between its ends) the spread is that of the linear estimate, G V Gᵀ.
  it('spread as the linear estimate does where no value is at zero', () => {
    const input = freeRate({
      points: freeRate().points.map((point) => ({ ...point, value: 3 })),
      difference: 2,
    });
    const prepared = prepareFreeForm(input);
    const strength = 1e4;
    const answer = freeFormAt(prepared, strength);
    const count = 1500;
    const rows = resampleFreeForm(prepared, answer, { seed: 5, first: 0, count });
    const { kernels } = answer.resolution!;
    for (const j of [12, 20, 28]) {
      const column = Array.from({ length: count }, (_, r) => rows[r * 40 + j]!);
      const mean = column.reduce((sum, value) => sum + value, 0) / count;
      const variance = column.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (count - 1);
      // G Gᵀ = G K (KᵀK + µLᵀL)⁻¹ …: the change of u by each datum, found by moving it.
      let expected = 0;
      input.points.forEach((_, i) => {
        const moved = {
          ...input,
          points: input.points.map((p, k) => (k === i ? { ...p, value: p.value + p.sigma } : p)),
        };
        expected +=
          (freeFormAt(prepareFreeForm(moved), strength).unknowns[j]! - answer.unknowns[j]!) ** 2;
      });
      // Relative error of a variance from 1500 draws: √(2/1500) = 3.7 %; four of these.
      expect(Math.abs(variance / expected - 1)).toBeLessThan(0.15);
      expect(Math.abs(mean - answer.unknowns[j]!)).toBeLessThan(4 * Math.sqrt(expected / count));
      expect(kernels[j]!.length).toBe(40);
    }
  });

  it('widen the bands where the depth scale is not held', () => {
    const widths = [LEVELS, free].map((parameters) => {
      const prepared = prepareFreeForm(scanOf(6, { parameters }));
      const rows = resampleFreeForm(prepared, freeFormAt(prepared, 1000), {
        seed: 2,
        first: 0,
        count: 200,
      });
      const { lower68, upper68, lower95, upper95 } = freeFormBands(prepared, rows, [70]);
      expect(lower95[0]!).toBeLessThan(lower68[0]!);
      expect(upper95[0]!).toBeGreaterThan(upper68[0]!);
      return upper68[0]! - lower68[0]!;
    });
    // 5 % of 70 nm at a slope of about 0.024 per nm is 0.08 on either side; noise alone gives about 0.015.
    expect(widths[1]!).toBeGreaterThan(3 * widths[0]!);
  });

  it('draw a correlated covariance as it is', () => {
    const plain = freeRate({ points: freeRate().points.map((point) => ({ ...point, value: 3 })) });
    const n = plain.points.length;
    const covariance = Array.from({ length: n }, (_, i) =>
      Array.from({ length: n }, (__, j) => 0.05 ** 2 * (i === j ? 1 : 0.9)),
    );
    const mean = ([own]: [FreeFormInput]): number => {
      const prepared = prepareFreeForm(own);
      const rows = resampleFreeForm(prepared, freeFormAt(prepared, 1e9), {
        seed: 4,
        first: 0,
        count: 400,
      });
      const column = Array.from({ length: 400 }, (_, r) => rows[r * 40 + 20]!);
      const middle = column.reduce((sum, value) => sum + value, 0) / 400;
      return Math.sqrt(column.reduce((sum, value) => sum + (value - middle) ** 2, 0) / 399);
    };
    // A constant from 13 points: σ/√13 where they are independent, σ·√(0.9 + 0.1/13) where they share nine tenths of their
    // variance.
    expect(Math.abs(mean([plain]) / (0.05 / Math.sqrt(13)) - 1)).toBeLessThan(0.15);
    expect(
      Math.abs(mean([{ ...plain, covariance }]) / (0.05 * Math.sqrt(0.9 + 0.1 / 13)) - 1),
    ).toBeLessThan(0.15);
  });
});

describe('the bands of a free-form profile', () => {
  // Source: the normal shares below −1 σ and of either tail of 95 %, on rows that run evenly from 0 to 1; linear between order
  // statistics is then exact.
  it('are the two-sided 68.27 and 95 % quantiles at each depth, rows that were not solved left out', () => {
    const prepared = prepareFreeForm(scanOf(1, { knotCount: 4 }));
    const count = 501;
    const rows = new Float64Array((count + 2) * 4).fill(NaN);
    // In no order, and the second knot twice as high as the first.
    for (let r = 0; r < count; r++)
      for (let j = 0; j < 4; j++) rows[r * 4 + j] = (((r * 101) % count) / (count - 1)) * (j + 1);
    const [first, second] = prepared.knotsNm;
    const bands = freeFormBands(prepared, rows, [first!, second!, (first! + second!) / 2]);
    [1, 2, 1.5].forEach((height, k) => {
      expect(bands.lower68[k]!).toBeCloseTo(0.15865525393145707 * height, 12);
      expect(bands.upper68[k]!).toBeCloseTo(0.8413447460685429 * height, 12);
      expect(bands.lower95[k]!).toBeCloseTo(0.025 * height, 12);
      expect(bands.upper95[k]!).toBeCloseTo(0.975 * height, 12);
    });
  });
});
