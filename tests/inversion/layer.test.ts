import { describe, expect, it } from 'vitest';
import {
  carrierProfile,
  farEdgeDepth,
  fit,
  prepareFit,
  resample,
  runChecks,
  simulateScan,
  type FitInput,
  type ParameterValues,
} from '@/lib/inversion/index';
import { answerOf, fractionInput, heldAt, rateInput } from './support/scans';

const TRUTH = {
  edgeDepthNm: 35,
  edgeWidthNm: 0,
  layerThicknessNm: 60,
  farEdgeWidthNm: 0,
  levelTop: 0.1,
  levelBulk: 2,
};

function measured(values: ParameterValues, seed: number): FitInput {
  const input = rateInput(
    {
      profile: 'layer',
      parameters: { edgeWidthNm: heldAt(0), farEdgeWidthNm: heldAt(0) },
    },
    0.03,
  );
  return { ...input, points: simulateScan({ input, values, seed }) };
}

describe('a layer', () => {
  it('is found where it was put: carriers between its edges and few on both sides', () => {
    const prepared = prepareFit(measured(TRUTH, 3));
    const answer = answerOf(fit(prepared));
    const [near, , thickness] = answer.parameters;
    expect(Math.abs(near!.value - 35) / near!.sigma!).toBeLessThan(3);
    expect(Math.abs(thickness!.value - 60) / thickness!.sigma!).toBeLessThan(3);
    const profile = carrierProfile(prepared, answer, null, { depthsNm: [10, 65, 130] });
    const [before, inside, behind] = profile.points;
    expect(inside!.value).toBeGreaterThan(10 * before!.value);
    expect(before!.value).toBe(behind!.value);
    expect(runChecks(prepared, answer, profile).find(({ id }) => id === 'edge-reach')!.state).toBe(
      'fine',
    );
  });

  // Source: the scatter of W₁ + thickness over resamples. Tolerance: three standard errors of a σ from 300 rows, and curvature.
  it('knows its far edge by the covariance of its depth and thickness', () => {
    const prepared = prepareFit(measured(TRUTH, 3));
    const answer = answerOf(fit(prepared));
    const far = farEdgeDepth(answer)!;
    const rows = resample(prepared, answer, { seed: 1, first: 0, count: 300 });
    const width = prepared.freeNames.length;
    const depths = Array.from(
      { length: 300 },
      (_, r) =>
        rows[r * width]! + rows[r * width + prepared.freeNames.indexOf('layerThicknessNm')]!,
    );
    const mean = depths.reduce((sum, depth) => sum + depth, 0) / 300;
    const spread = Math.sqrt(depths.reduce((sum, depth) => sum + (depth - mean) ** 2, 0) / 299);
    expect(far.value).toBeCloseTo(answer.parameters[0]!.value + answer.parameters[2]!.value, 12);
    expect(Math.abs(spread / far.sigma - 1)).toBeLessThan(0.15);
    const apart = Math.hypot(answer.parameters[0]!.sigma!, answer.parameters[2]!.sigma!);
    expect(far.sigma).toBeLessThan(0.9 * apart);
    const graded = answerOf(
      fit(prepareFit({ ...measured(TRUTH, 3), profile: 'graded', parameters: {} })),
    );
    expect(() => farEdgeDepth(graded)).toThrow(expect.objectContaining({ code: 'wrong-fit' }));
  });

  it('says when its far edge lies deeper than the muons go', () => {
    const input = measured({ ...TRUTH, layerThicknessNm: 170 }, 3);
    const held = { ...input, parameters: { ...input.parameters, layerThicknessNm: heldAt(170) } };
    const prepared = prepareFit(held);
    const answer = answerOf(fit(prepared));
    const checks = runChecks(prepared, answer, carrierProfile(prepared, answer));
    expect(checks.find(({ id }) => id === 'edge-reach')).toMatchObject({
      state: 'caution',
      message: expect.stringMatching(/far edge of the layer at \d+ nm lies beyond the reach/),
    });
  });

  it('of no thickness is a scan without an edge', () => {
    const flat = fractionInput({ profile: 'layer' });
    const points = flat.points.map((point) => ({ ...point, value: 0.5 }));
    expect(fit(prepareFit({ ...flat, points })).status).toBe('no-minimum');
  });
});
