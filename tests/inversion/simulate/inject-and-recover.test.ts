import { describe, expect, it } from 'vitest';
import {
  injectAndRecover,
  recoveryReport,
  type FitInput,
  type Injection,
  type ParameterValues,
  type RecoveryReport,
} from '@/lib/inversion/index';
import { fractionInput, free, freeWith, rateInput } from '../support/scans';

const SCANS = 200;
const graded = fractionInput({}, 0.006);
const truth = { edgeDepthNm: 75, edgeWidthNm: 18, levelTop: 0.74, levelBulk: 0.32 };

function report(injection: Injection, count = SCANS): RecoveryReport {
  return recoveryReport(injectAndRecover(injection, { seed: 1, first: 0, count }));
}

describe('injecting and recovering', () => {
  // Source: the meaning of bias, σ and coverage. Tolerance: three standard errors of 200 scans; for the spread of the pulls that
  // is 3/√(2n) = 0.15. The mean of an edge near the limit of the scan carries a small true bias of the least squares, second order
  // in σ: none is seen here.
  it.each<[string, FitInput, ParameterValues]>([
    ['graded, fraction', graded, truth],
    [
      'sharp, rate, depth scale and a level with priors',
      rateInput(
        {
          profile: 'sharp',
          parameters: { depthScale: free, levelTop: freeWith(0.1, 0.02) },
        },
        0.06,
      ),
      { edgeDepthNm: 60, levelBulk: 2 },
    ],
    [
      'graded, fraction, full covariance',
      {
        ...graded,
        // Half of each variance is an error of the level that all points share.
        covariance: graded.points.map((_, i) =>
          graded.points.map((__, j) => 0.006 ** 2 * (i === j ? 1 : 0.5)),
        ),
      },
      truth,
    ],
  ])('finds the truth again, with the scatter and coverage stated: %s', (_, input, values) => {
    const { scans, withoutMinimum, parameters } = report({ input, values });
    expect([scans, withoutMinimum]).toEqual([SCANS, 0]);
    for (const { name, bias, spread, meanSigma, pulls, coverage68, coverage95 } of parameters) {
      expect(Math.abs(bias.value), name).toBeLessThan(3 * bias.standardError);
      expect(Math.abs(spread / meanSigma! - 1), name).toBeLessThan(3 / Math.sqrt(2 * SCANS));
      expect(Math.abs(pulls!.spread - 1), name).toBeLessThan(3 / Math.sqrt(2 * SCANS));
      for (const { share, stated, standardError } of [coverage68, coverage95])
        expect(Math.abs(share - stated), name).toBeLessThan(3 * standardError);
    }
  });

  // Source: the planted error itself. Points that scatter twice as much as they state put the truth inside ±½σ and ±0.98σ of the
  // real scatter: 38 % and 67 %.
  it('sees points whose σ are stated half too small', () => {
    const { parameters } = report({ input: graded, values: truth, noiseFactor: 2 });
    const edge = parameters.find(({ name }) => name === 'edgeDepthNm')!;
    expect(edge.coverage68.share).toBeLessThan(0.6827 - 3 * edge.coverage68.standardError);
    expect(edge.coverage95.share).toBeLessThan(0.95 - 3 * edge.coverage95.standardError);
    expect(Math.abs(edge.coverage68.share - 0.383)).toBeLessThan(3 * Math.sqrt(0.236 / SCANS));
    expect(Math.abs(edge.coverage95.share - 0.673)).toBeLessThan(3 * Math.sqrt(0.22 / SCANS));
    expect(Math.abs(edge.pulls!.spread - 2)).toBeLessThan(6 / Math.sqrt(2 * SCANS));
  });

  it('draws the truth of a parameter with a prior from its prior', () => {
    const input = fractionInput({ parameters: { depthScale: freeWith(1, 0.1) } }, 0.006);
    const scans = injectAndRecover(
      { input, values: truth, intervalsFor: [] },
      { seed: 2, first: 0, count: SCANS },
    );
    const truths = scans.map((scan) => scan!.find(({ name }) => name === 'depthScale')!.truth);
    const mean = truths.reduce((a, b) => a + b, 0) / SCANS;
    const spread = Math.sqrt(truths.reduce((sum, t) => sum + (t - mean) ** 2, 0) / (SCANS - 1));
    expect(Math.abs(mean - 1)).toBeLessThan((3 * 0.1) / Math.sqrt(SCANS));
    expect(Math.abs(spread / 0.1 - 1)).toBeLessThan(3 / Math.sqrt(2 * SCANS));
    expect(scans.every((scan) => scan!.find(({ name }) => name === 'edgeDepthNm')!.truth === 75));
  });

  it('counts the scans that have no minimum and leaves them out', () => {
    const flat = { ...truth, levelTop: 0.5, levelBulk: 0.5 };
    const scans = injectAndRecover(
      { input: fractionInput({ profile: 'sharp' }, 0.05), values: flat, intervalsFor: [] },
      { seed: 1, first: 0, count: 60 },
    );
    const { withoutMinimum, parameters } = recoveryReport(scans);
    expect(withoutMinimum).toBe(scans.filter((scan) => scan === null).length);
    expect(withoutMinimum).toBeGreaterThan(0);
    expect(withoutMinimum).toBeLessThan(60);
    expect(parameters[0]!.bias.standardError).toBeCloseTo(
      parameters[0]!.spread / Math.sqrt(60 - withoutMinimum),
      12,
    );
    expect(recoveryReport([null, null])).toEqual({ scans: 2, withoutMinimum: 2, parameters: [] });
  });

  it('gives scan r the same numbers whatever the block', () => {
    const injection = { input: graded, values: truth, intervalsFor: [] };
    const whole = injectAndRecover(injection, { seed: 3, first: 0, count: 12 });
    const parts = [
      ...injectAndRecover(injection, { seed: 3, first: 0, count: 5 }),
      ...injectAndRecover(injection, { seed: 3, first: 5, count: 7 }),
    ];
    expect(parts).toEqual(whole);
  });

  it('refuses a noise factor and a block that are none', () => {
    const block = { seed: 1, first: 0, count: 1 };
    const injection = { input: graded, values: truth };
    expect(() => injectAndRecover({ ...injection, noiseFactor: 0 }, block)).toThrow(
      expect.objectContaining({ code: 'bad-noise' }),
    );
    expect(() => injectAndRecover(injection, { ...block, seed: 0.5 })).toThrow(
      expect.objectContaining({ code: 'bad-block' }),
    );
    expect(() => injectAndRecover({ ...injection, values: {} }, block)).toThrow(
      expect.objectContaining({ code: 'no-value' }),
    );
  });
});
