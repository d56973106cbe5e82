import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import {
  bootstrapLikelihoodRatio,
  fit,
  foldScan,
  likelihoodRatioTest,
  prepareFit,
  simulateScan,
  valuesOf,
  zeroWidthTest,
  type FitInput,
  type NestedFits,
  type ParameterValues,
  type ProfileKind,
} from '@/lib/inversion/index';
import { normalStream } from '@/lib/inversion/statistics/random';
import { answerOf, fractionInput, free, freeWith, heldAt } from '../support/scans';

const SHARP = { edgeDepthNm: 75, edgeWidthNm: 0, levelTop: 0.74, levelBulk: 0.32 };

function fitsOf(template: FitInput, values: ParameterValues, seed: number): NestedFits {
  const points = simulateScan({ input: template, values, seed });
  const fitted = (profile: ProfileKind) => {
    const prepared = prepareFit({ ...template, points, profile });
    return { prepared, answer: answerOf(fit(prepared, { intervalsFor: [] })) };
  };
  return { simpler: fitted('sharp'), richer: fitted('graded') };
}

const template = fractionInput({}, 0.004);

/** V of points that share an error of their level and one that drifts with energy, 0.004 in all. */
const correlated: FitInput = {
  ...template,
  covariance: template.points.map((_, i) =>
    template.points.map(
      (__, j) => 0.004 ** 2 * (i === j ? 1 : 0.3 + 0.4 * Math.exp(-Math.abs(i - j) / 4)),
    ),
  ),
};

describe('the bootstrap likelihood ratio', () => {
  // Source: Self and Liang, J. Am. Stat. Assoc. 82, 605 (1987), case 5, exact in the limit of precise data: half of the
  // statistics are zero, 5 % lie above 2.706, and p is that of the mixture. σ of 0.004 against a contrast of 0.42 is near that
  // limit. Tolerance: three Monte-Carlo standard errors of 800 resamples.
  it.each<[string, FitInput]>([
    ['levels free', template],
    [
      'depth scale free, prior on a level',
      fractionInput({ parameters: { depthScale: free, levelBulk: freeWith(0.32, 0.01) } }, 0.004),
    ],
  ])('agrees with the half-half mixture on scans of a sharp edge: %s', (_, input) => {
    for (const seed of [2, 5]) {
      const fits = fitsOf(input, SHARP, seed);
      const statistics = bootstrapLikelihoodRatio(fits, { seed: 9, first: 0, count: 800 });
      const share = (above: number): number =>
        statistics.filter((value) => value > above).length / statistics.length;
      expect(Math.abs(share(1e-3) - 0.5)).toBeLessThan(3 * Math.sqrt(0.25 / 800));
      expect(Math.abs(share(2.705543) - 0.05)).toBeLessThan(3 * Math.sqrt((0.05 * 0.95) / 800));
      const test = likelihoodRatioTest(fits, statistics);
      const mixture = zeroWidthTest(fits.simpler.answer, fits.richer.answer);
      expect(test.statistic).toBe(mixture.statistic);
      expect(Math.abs(test.pValue - mixture.pValue)).toBeLessThanOrEqual(3 * test.standardError);
    }
  });

  // Source: the definition, p = (1 + 0)/(1 + B).
  it('stands at its floor where the edge is wide', () => {
    const fits = fitsOf(template, { ...SHARP, edgeWidthNm: 40 }, 1);
    const statistics = bootstrapLikelihoodRatio(fits, { seed: 1, first: 0, count: 199 });
    expect(likelihoodRatioTest(fits, statistics)).toMatchObject({
      pValue: 0.005,
      atFloor: true,
      resamples: 199,
    });
  });

  // Source: two full fits, each with its own search, of the very numbers that row r drew: ŷ + L·z with V = LLᵀ, L from ml-matrix.
  // Tolerance: the refit takes its last step unseen, where less than 1e-5 of 1 + Φ is left; seen in 1,200 rows: 4e-4.
  it.each<[string, FitInput]>([
    ['σ', fractionInput({}, 0.012)],
    ['full covariance', correlated],
  ])(
    'finds for each row the statistic that two full fits of the same numbers find: %s',
    (_, input) => {
      const fits = fitsOf(input, SHARP, 3);
      const statistics = bootstrapLikelihoodRatio(fits, { seed: 4, first: 0, count: 40 });
      const { prepared, answer } = fits.simpler;
      const expected = foldScan(prepared, valuesOf(answer));
      const factor = input.covariance
        ? new CholeskyDecomposition(new Matrix(input.covariance.map((row) => [...row])))
            .lowerTriangularMatrix
        : Matrix.diag(input.points.map(({ sigma }) => sigma));
      statistics.forEach((statistic, r) => {
        const normal = normalStream(4, r);
        const noise = factor.mmul(Matrix.columnVector(expected.map(() => normal())));
        const points = prepared.input.points.map((point, i) => ({
          ...point,
          value: expected[i]! + noise.get(i, 0),
        }));
        const chiSquare = (profile: ProfileKind): number =>
          answerOf(fit(prepareFit({ ...prepared.input, points, profile }), { intervalsFor: [] }))
            .chiSquare;
        const full = Math.max(0, chiSquare('sharp') - chiSquare('graded'));
        expect(Math.abs(statistic - full), `row ${r}`).toBeLessThan(1e-3);
      });
    },
  );

  it('gives row r the same bits whatever the block', () => {
    const fits = fitsOf(template, SHARP, 2);
    const whole = bootstrapLikelihoodRatio(fits, { seed: 5, first: 0, count: 30 });
    const parts = [7, 1, 22].reduce<{ at: number; rows: number[] }>(
      ({ at, rows }, count) => ({
        at: at + count,
        rows: [...rows, ...bootstrapLikelihoodRatio(fits, { seed: 5, first: at, count })],
      }),
      { at: 0, rows: [] },
    );
    expect(parts.rows).toEqual([...whole]);
    expect([...bootstrapLikelihoodRatio(fits, { seed: 6, first: 0, count: 30 })]).not.toEqual([
      ...whole,
    ]);
  });

  // Source: graded is the layer whose far edge lies out of reach, where the thickness and the far width mean nothing: no mixture is
  // known for that, and the bootstrap is the test. On a scan of a layer it is at its floor; on one of a single edge it is not.
  it('tells a layer from a single edge', () => {
    const layerOrEdge = (layer: boolean): number => {
      const layerInput = fractionInput({ profile: 'layer' }, 0.004);
      const values = { ...SHARP, edgeWidthNm: 12 };
      const points = layer
        ? simulateScan({
            input: layerInput,
            values: { ...values, edgeDepthNm: 50, layerThicknessNm: 60, farEdgeWidthNm: 12 },
            seed: 1,
          })
        : simulateScan({ input: template, values, seed: 1 });
      const fitted = (profile: ProfileKind) => {
        const prepared = prepareFit({ ...template, points, profile });
        return { prepared, answer: answerOf(fit(prepared, { intervalsFor: [] })) };
      };
      const fits = { simpler: fitted('graded'), richer: fitted('layer') };
      return likelihoodRatioTest(
        fits,
        bootstrapLikelihoodRatio(fits, { seed: 1, first: 0, count: 49 }),
      ).pValue;
    };
    expect(layerOrEdge(true)).toBe(0.02);
    expect(layerOrEdge(false)).toBeGreaterThan(0.05);
  });

  it('refuses fits that are not nested, and a test of no resamples', () => {
    const fits = fitsOf(template, SHARP, 2);
    const block = { seed: 1, first: 0, count: 1 };
    const other = (change: Partial<FitInput>): NestedFits['richer'] => {
      const prepared = prepareFit({ ...fits.richer.prepared.input, ...change });
      return { prepared, answer: answerOf(fit(prepared, { intervalsFor: [] })) };
    };
    const refused = (richer: NestedFits['richer'], simpler = fits.simpler): void => {
      expect(() => bootstrapLikelihoodRatio({ simpler, richer }, block)).toThrow(
        expect.objectContaining({ code: 'not-nested' }),
      );
    };
    refused(fits.simpler, fits.richer);
    refused(other({ parameters: { levelTop: heldAt(0.74) } }));
    refused(other({ parameters: { levelTop: freeWith(0.74, 0.01) } }));
    refused(other({ covariance: correlated.covariance! }));
    refused(other({ points: fits.richer.prepared.input.points.slice(1) }));
    expect(() => likelihoodRatioTest(fits, [])).toThrow(
      expect.objectContaining({ code: 'no-resamples' }),
    );
    expect(() => bootstrapLikelihoodRatio(fits, { ...block, count: -1 })).toThrow(
      expect.objectContaining({ code: 'bad-block' }),
    );
  });
});
