import { describe, expect, it } from 'vitest';
import {
  fit,
  foldScan,
  prepareFit,
  simulateScan,
  smallestWidthFromSharp,
  valuesOf,
  type FitInput,
  type NestedFits,
  type ParameterValues,
  type ProfileKind,
} from '@/lib/inversion/index';
import { likelihoodRatioStatistics } from '@/lib/inversion/compare/likelihood-ratio-statistics';
import { answerOf, fractionInput, free, freeWith, rateInput } from '../support/scans';

const SHARP = { edgeDepthNm: 75, edgeWidthNm: 0, levelTop: 0.74, levelBulk: 0.32 };

function fitsOf(template: FitInput, values: ParameterValues): NestedFits {
  const points = simulateScan({ input: template, values, seed: 1 });
  const fitted = (profile: ProfileKind) => {
    const prepared = prepareFit({ ...template, points, profile });
    return { prepared, answer: answerOf(fit(prepared, { intervalsFor: [] })) };
  };
  return { simpler: fitted('sharp'), richer: fitted('graded') };
}

describe('the smallest width told from a sharp edge', () => {
  // Source: what 80 % power and 95 % confidence mean, by simulating the test itself: scans of that width, and of a sharp edge,
  // fitted by both. Tolerance: three standard errors of 600 scans, 0.049 of 0.80 and 0.027 of 0.05, and 0.015 for the normal
  // approximation of the power.
  it.each<[string, FitInput, ParameterValues]>([
    ['fraction', fractionInput({}, 0.004), SHARP],
    [
      'fraction, depth scale free, prior on a level',
      fractionInput({ parameters: { depthScale: free, levelBulk: freeWith(0.32, 0.01) } }, 0.004),
      SHARP,
    ],
    ['rate', rateInput({}, 0.05), { ...SHARP, edgeDepthNm: 60, levelTop: 0.1, levelBulk: 2 }],
  ])(
    'is told in four of five simulated scans, a sharp edge in one of twenty: %s',
    (_, template, values) => {
      const fits = fitsOf(template, values);
      const { prepared, answer } = fits.simpler;
      const { widthNm } = smallestWidthFromSharp(prepared, answer);
      const rejected = (edgeWidthNm: number): number => {
        const truth = {
          prepared: fits.richer.prepared,
          values: { ...valuesOf(answer), edgeWidthNm },
        };
        const block = { seed: 3, first: 0, count: 600 };
        const statistics = likelihoodRatioStatistics(fits, truth, block);
        return statistics.filter((statistic) => statistic > 2.705543).length / 600;
      };
      expect(Math.abs(rejected(widthNm!) - 0.8)).toBeLessThan(0.049 + 0.015);
      expect(Math.abs(rejected(0) - 0.05)).toBeLessThan(0.027);
    },
  );

  // Source: χ² of a full sharp fit of the noise-free scan, which is what T_A is.
  it('takes T_A from the best sharp edge', () => {
    const { prepared, answer } = fitsOf(fractionInput({}, 0.004), SHARP).richer;
    const { powers } = smallestWidthFromSharp(prepared, answer);
    for (const k of [1, 2, 6, 20]) {
      const { widthNm, sigmas } = powers[k]!;
      const values = foldScan(prepared, { ...valuesOf(answer), edgeWidthNm: widthNm });
      const points = prepared.input.points.map((point, i) => ({ ...point, value: values[i]! }));
      const sharp = answerOf(
        fit(prepareFit({ ...prepared.input, points, profile: 'sharp' }), { intervalsFor: [] }),
      );
      expect(sigmas ** 2 / sharp.chiSquare).toBeCloseTo(1, 5);
    }
  });

  // Source: a width adds in squares to the straggling, so √T_A starts as w²; and √T_A scales as 1/σ. So with a quarter of the σ
  // the width is halved, to the next order in w over the straggling (here 11 nm against 30).
  it('is halved by four times better points', () => {
    const widthOf = (sigma: number): number => {
      const { prepared, answer } = fitsOf(fractionInput({}, sigma), SHARP).simpler;
      return smallestWidthFromSharp(prepared, answer).widthNm!;
    };
    expect(widthOf(0.001) / widthOf(0.004)).toBeGreaterThan(0.46);
    expect(widthOf(0.001) / widthOf(0.004)).toBeLessThan(0.52);
  });

  it('says so where no width would be told, with the range', () => {
    const { prepared, answer } = fitsOf(fractionInput({}, 0.03), SHARP).simpler;
    const smallest = smallestWidthFromSharp(prepared, answer);
    expect(smallest.widthNm).toBeNull();
    expect(smallest.rangeNm).toEqual([0, 320]);
    expect(smallest.reason).toMatch(/^No width up to 320 nm would be told/);
    expect(Math.max(...smallest.powers.map(({ power }) => power))).toBeLessThan(0.8);
  });

  it('starts at the false alarms of the test', () => {
    const { prepared, answer } = fitsOf(fractionInput({}, 0.004), SHARP).simpler;
    const { powers } = smallestWidthFromSharp(prepared, answer);
    expect(powers[0]).toMatchObject({ widthNm: 0 });
    expect(powers[0]!.power).toBeCloseTo(0.05, 6);
  });
});
