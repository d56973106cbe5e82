import { describe, expect, it } from 'vitest';
import {
  compareFits,
  fit,
  InversionError,
  prepareFit,
  simulateScan,
  zeroWidthTest,
  type FitAnswer,
  type FitInput,
} from '@/lib/inversion/index';
import { answerOf, fractionInput } from './support/scans';

const truth = { edgeDepthNm: 75, edgeWidthNm: 25, levelTop: 0.74, levelBulk: 0.32 };
const template = fractionInput({}, 0.004);
const points = simulateScan({ input: template, values: truth, seed: 1 });
const answer = (change: Partial<FitInput>): FitAnswer =>
  answerOf(fit(prepareFit({ ...template, points, ...change }), { intervalsFor: [] }));
const graded = answer({});
const sharp = answer({ profile: 'sharp' });

describe('comparing fits', () => {
  // Source: Burnham and Anderson, Model Selection and Multimodel Inference (2002), section 2.9: w_k ∝ exp(−Δ_k/2).
  it('weighs them by AICc', () => {
    const { rows, comparable } = compareFits([
      { label: 'sharp', answer: sharp },
      { label: 'graded', answer: graded },
    ]);
    expect(comparable).toBe(true);
    const delta = sharp.aicc! - graded.aicc!;
    expect(delta).toBeGreaterThan(2);
    expect(rows.map(({ deltaAicc }) => deltaAicc)).toEqual([delta, 0]);
    expect(rows[0]!.weight! + rows[1]!.weight!).toBeCloseTo(1, 12);
    expect(rows[1]!.weight! / rows[0]!.weight! / Math.exp(delta / 2)).toBeCloseTo(1, 10);
  });

  // Source: G. Schwarz, Ann. Stat. 6, 461 (1978): BIC = χ² + k ln n; R. E. Kass and A. E. Raftery, J. Am. Stat. Assoc. 90, 773
  // (1995): odds of exp(−½ΔBIC). Worked by hand from χ², 3 and 4 parameters and 13 points.
  it('weighs them by BIC', () => {
    const { rows } = compareFits([
      { label: 'sharp', answer: sharp },
      { label: 'graded', answer: graded },
    ]);
    const delta = sharp.chiSquare - graded.chiSquare - Math.log(13);
    expect(rows[0]!.deltaBic).toBeCloseTo(delta, 10);
    expect(rows[1]!.deltaBic).toBe(0);
    expect(rows[0]!.bicWeight! + rows[1]!.bicWeight!).toBeCloseTo(1, 12);
    expect(rows[1]!.bicWeight! / rows[0]!.bicWeight! / Math.exp(delta / 2)).toBeCloseTo(1, 10);
  });

  it('does not weigh fits of different points', () => {
    const fewer = answer({ points: points.map((p, i) => ({ ...p, enabled: i !== 3 })) });
    const comparison = compareFits([
      { label: 'all', answer: graded },
      { label: 'fewer', answer: fewer },
    ]);
    expect(comparison.comparable).toBe(false);
    expect(comparison.reason).toContain('same points');
    expect(comparison.rows.map(({ weight }) => weight)).toEqual([null, null]);
    expect(comparison.rows.map(({ bicWeight }) => bicWeight)).toEqual([null, null]);
  });

  it('counts a switched-off point as absent, whatever its value', () => {
    const off = (value: number): FitAnswer =>
      answer({ points: points.map((p, i) => (i === 3 ? { ...p, enabled: false, value } : p)) });
    expect(
      compareFits([
        { label: 'a', answer: off(0.1) },
        { label: 'b', answer: off(0.9) },
      ]).comparable,
    ).toBe(true);
  });

  it('lists fits that have no AICc without a weight', () => {
    const none = compareFits([{ label: 'a', answer: { ...graded, aicc: null } }]);
    expect(none.rows[0]).toMatchObject({ aicc: null, deltaAicc: null, weight: null });
  });
});

describe('the zero-width test', () => {
  // Source: Self and Liang (1987): half the mass at zero, half χ² with one degree of freedom, whose 5 % point is then 2.706 (the
  // 10 % point of χ²₁, Abramowitz and Stegun table 26.8, from memory).
  it('halves the tail of χ²', () => {
    const at = (statistic: number) =>
      zeroWidthTest({ ...sharp, chiSquare: graded.chiSquare + statistic }, graded);
    expect(at(2.70554).pValue).toBeCloseTo(0.05, 5);
    expect(at(4).sigmas).toBe(2);
    expect(at(9).pValue).toBeCloseTo(0.001349898, 8);
    expect(at(0)).toEqual({ statistic: 0, pValue: 1, sigmas: 0 });
    expect(at(-1e-9).statistic).toBe(0);
    expect(at(900).pValue).toBeGreaterThan(0);
  });

  it('rejects a sharp edge where the scan is clear', () => {
    expect(zeroWidthTest(sharp, graded).sigmas).toBeGreaterThan(2);
    expect(() => zeroWidthTest(graded, sharp)).toThrow(InversionError);
  });

  // Source: as above, by simulation: under a sharp truth about half of the scans give a statistic of zero. 120 scans know a share
  // of a half to 0.046; three of those.
  it('gives zero in about half of the scans of a sharp edge', () => {
    const edge = { ...truth, edgeDepthNm: 75, edgeWidthNm: 0 };
    const statistics = Array.from({ length: 120 }, (_, seed) => {
      const input: FitInput = {
        ...template,
        points: simulateScan({ input: template, values: edge, seed: 500 + seed }),
      };
      const both = (['sharp', 'graded'] as const).map((profile) =>
        answerOf(fit(prepareFit({ ...input, profile }), { intervalsFor: [] })),
      );
      return zeroWidthTest(both[0]!, both[1]!).statistic;
    });
    const zeros = statistics.filter((statistic) => statistic < 1e-3).length / statistics.length;
    const rejected =
      statistics.filter((statistic) => statistic > 2.70554).length / statistics.length;
    expect(zeros).toBeGreaterThan(0.5 - 0.14);
    expect(zeros).toBeLessThan(0.5 + 0.14);
    expect(rejected).toBeLessThan(0.05 + 0.06);
  });
});
