import { describe, expect, it } from 'vitest';
import {
  bootstrapBands,
  carrierProfile,
  fit,
  foldScan,
  InversionError,
  prepareFit,
  resample,
  simulateScan,
  valuesOf,
  type FitInput,
  type ParameterName,
} from '@/lib/inversion/index';
import { normalStream } from '@/lib/inversion/statistics/random';
import { answerOf, fractionInput, free, freeWith, rateInput } from './support/scans';

const truth = { edgeDepthNm: 75, edgeWidthNm: 16, levelTop: 0.74, levelBulk: 0.32 };

function fitted(change: Partial<FitInput> = {}, sigma = 0.004) {
  const template = fractionInput(change, sigma);
  const prepared = prepareFit({
    ...template,
    points: simulateScan({ input: template, values: truth, seed: 11 }),
  });
  return { prepared, answer: answerOf(fit(prepared)) };
}

const columnOf = (rows: Float64Array, width: number, k: number): number[] =>
  Array.from({ length: rows.length / width }, (_, r) => rows[r * width + k]!);
const meanOf = (list: readonly number[]): number => list.reduce((a, b) => a + b, 0) / list.length;
const scatterOf = (list: readonly number[]): number =>
  Math.sqrt(list.reduce((sum, x) => sum + (x - meanOf(list)) ** 2, 0) / (list.length - 1));

describe('resampling', () => {
  it('gives row r the same bits whatever the block', () => {
    const { prepared, answer } = fitted();
    const whole = resample(prepared, answer, { seed: 5, first: 0, count: 40 });
    const blocks = [7, 1, 12, 20].reduce<{ at: number; rows: number[] }>(
      ({ at, rows }, count) => ({
        at: at + count,
        rows: [...rows, ...resample(prepared, answer, { seed: 5, first: at, count })],
      }),
      { at: 0, rows: [] },
    );
    expect(blocks.rows).toEqual([...whole]);
    const again = fitted();
    expect([...resample(again.prepared, again.answer, { seed: 5, first: 0, count: 40 })]).toEqual([
      ...whole,
    ]);
    expect([...resample(prepared, answer, { seed: 6, first: 0, count: 40 })]).not.toEqual([
      ...whole,
    ]);
  });

  // Source: for a nearly linear problem the bootstrap scatter is the linear error bar. 600 rows know it to 3 % (1/√(2n)); four of
  // those plus a few per cent of curvature.
  it('scatters as the covariance says where the problem is nearly linear', () => {
    const { prepared, answer } = fitted(
      { parameters: { depthScale: free, levelBulk: freeWith(0.32, 0.02) } },
      0.002,
    );
    const rows = resample(prepared, answer, { seed: 1, first: 0, count: 600 });
    prepared.freeNames.forEach((name, k) => {
      const column = columnOf(rows, prepared.freeNames.length, k);
      const { sigma, value } = answer.parameters.find((parameter) => parameter.name === name)!;
      expect(scatterOf(column) / sigma!, name).toBeGreaterThan(0.85);
      expect(scatterOf(column) / sigma!, name).toBeLessThan(1.15);
      expect(Math.abs(meanOf(column) - value) / sigma!, name).toBeLessThan(0.25);
    });
  });

  // Source: priors are pseudo-observations, so a depth scale that only its prior knows scatters by the prior.
  it('resamples priors and nuisances too', () => {
    const { prepared, answer } = fitted({ parameters: { depthScale: free } });
    const rows = resample(prepared, answer, { seed: 2, first: 0, count: 600 });
    const scale = columnOf(
      rows,
      prepared.freeNames.length,
      prepared.freeNames.indexOf('depthScale' as ParameterName),
    );
    expect(scatterOf(scale)).toBeGreaterThan(0.03 * 0.9);
    expect(scatterOf(scale)).toBeLessThan(0.03 * 1.1);
  });

  // Source: the full fit, with its own search, of the very numbers that row r drew. Poor data (signal to noise 20) give several valleys.
  it.each(['graded', 'sharp'] as const)(
    'finds for each row the minimum that a full %s fit of the same numbers finds',
    (profile) => {
      const { prepared, answer } = fitted({ profile }, 0.02);
      const rows = resample(prepared, answer, { seed: 3, first: 0, count: 150 });
      const width = prepared.freeNames.length;
      const expected = foldScan(prepared, valuesOf(answer));
      for (let r = 0; r < 150; r++) {
        const normal = normalStream(3, r);
        const points = prepared.input.points.map((p, i) => ({
          ...p,
          value: expected[i]! + p.sigma * normal(),
        }));
        const outcome = fit(prepareFit({ ...prepared.input, points }), { intervalsFor: [] });
        if (outcome.status === 'no-minimum') continue;
        const values = {
          ...valuesOf(answer),
          ...Object.fromEntries(prepared.freeNames.map((name, k) => [name, rows[r * width + k]!])),
        };
        const predicted = foldScan(prepared, values);
        const chiSquare = points.reduce(
          (sum, p, i) => sum + ((p.value - predicted[i]!) / p.sigma) ** 2,
          0,
        );
        expect(chiSquare - outcome.answer.chiSquare, `row ${r}`).toBeLessThan(0.01);
        expect(chiSquare - outcome.answer.chiSquare, `row ${r}`).toBeGreaterThan(-0.01);
      }
    },
  );

  it('refuses a block that is no block', () => {
    const { prepared, answer } = fitted();
    for (const block of [
      { seed: 1, first: -1, count: 2 },
      { seed: 1.5, first: 0, count: 2 },
      { seed: 1, first: 0, count: NaN },
    ]) {
      expect(() => resample(prepared, answer, block)).toThrow(InversionError);
    }
  });
});

describe('bands', () => {
  // Source: order statistics of a known list, counted by hand: of the rows 0…100 the quantile u is 100u.
  it('are pointwise quantiles of the resampled profiles', () => {
    const template = rateInput({ profile: 'sharp' });
    const values = { edgeDepthNm: 70, levelTop: 0.05, levelBulk: 2 };
    const prepared = prepareFit({
      ...template,
      points: simulateScan({ input: template, values, seed: 1 }),
    });
    const answer = answerOf(fit(prepared));
    expect(prepared.freeNames).toEqual(['edgeDepthNm', 'levelTop', 'levelBulk']);
    const rows = Float64Array.from(
      Array.from({ length: 101 }, (_, r) => [70, 0.01, 0.01 + r]).flat(),
    );
    const bands = bootstrapBands(prepared, answer, rows, [10, 100]);
    // γ = 1e-6 cm³/s: 1 µs⁻¹ is 1e12 cm⁻³.
    expect(
      [bands.lower68[1]!, bands.upper68[1]!, bands.lower95[1]!, bands.upper95[1]!].map((p) =>
        Number((p / 1e12).toFixed(3)),
      ),
    ).toEqual([15.866, 84.134, 2.5, 97.5]);
    expect([...bands.lower95, ...bands.upper95].filter((_, k) => k % 2 === 0)).toEqual([0, 0]);
    expect(() => bootstrapBands(prepared, answer, rows.subarray(0, 4), [10])).toThrow(
      InversionError,
    );
  });

  it('hold the profile, nest, and the preview agrees with the bootstrap to a few hundredths of a share', () => {
    const { prepared, answer } = fitted({}, 0.003);
    const rows = resample(prepared, answer, { seed: 4, first: 0, count: 800 });
    const depthsNm = Array.from({ length: 41 }, (_, k) => 4 * k);
    const bootstrap = carrierProfile(
      prepared,
      answer,
      bootstrapBands(prepared, answer, rows, depthsNm),
    );
    const preview = carrierProfile(prepared, answer, null, { depthsNm });
    expect(bootstrap.bands).toBe('bootstrap');
    expect(preview.bands).toBe('delta');
    bootstrap.points.forEach((point, k) => {
      const quick = preview.points[k]!;
      for (const { lower95, lower68, value, upper68, upper95 } of [point, quick]) {
        expect(lower95!).toBeLessThanOrEqual(lower68!);
        expect(lower68!).toBeLessThanOrEqual(value + 0.01);
        expect(value).toBeLessThanOrEqual(upper68! + 0.01);
        expect(upper68!).toBeLessThanOrEqual(upper95!);
        expect(lower95!).toBeGreaterThanOrEqual(0);
        expect(upper95!).toBeLessThanOrEqual(1);
      }
      expect(Math.abs(quick.upper68! - point.upper68!)).toBeLessThan(0.04);
      expect(Math.abs(quick.lower68! - point.lower68!)).toBeLessThan(0.04);
    });
  });
});
