import { describe, expect, it } from 'vitest';
import { fit, prepareFit, simulateScan, type FitInput, type Interval } from '@/lib/inversion/index';
import { normalStream } from '@/lib/inversion/statistics/random';
import { answerOf, fractionInput, free, rateInput } from './support/scans';

const SCANS = 300;

/** Share of simulated scans whose interval of the edge holds the truth. */
function coverageOf(
  template: FitInput,
  values: Parameters<typeof simulateScan>[0]['values'],
  scatterScale: boolean,
): { in68: number; in95: number } {
  let in68 = 0;
  let in95 = 0;
  for (let seed = 0; seed < SCANS; seed++) {
    const { edgeDepthNm } = values;
    // The truth of the depth scale is drawn from its prior: that is what the prior says.
    const depthScale = scatterScale ? 1 + 0.03 * normalStream(77, seed)() : 1;
    const points = simulateScan({
      input: { ...template, parameters: { ...template.parameters, depthScale: free } },
      values: { ...values, depthScale },
      seed,
    });
    const [edge] = answerOf(
      fit(prepareFit({ ...template, points }), { intervalsFor: ['edgeDepthNm'] }),
    ).parameters;
    const holds = ([lower, upper]: Interval): boolean =>
      (lower === null || lower <= edgeDepthNm!) && (upper === null || edgeDepthNm! <= upper);
    if (holds(edge!.interval68)) in68++;
    if (holds(edge!.interval95)) in95++;
  }
  return { in68: in68 / SCANS, in95: in95 / SCANS };
}

describe('the intervals of the edge', () => {
  // Source: the meaning of a confidence interval. Tolerance: three standard errors of a share of 300 scans.
  it.each<[string, FitInput, Parameters<typeof simulateScan>[0]['values'], boolean]>([
    [
      'graded, fraction, depth scale held',
      fractionInput({}, 0.006),
      { edgeDepthNm: 75, edgeWidthNm: 18, levelTop: 0.74, levelBulk: 0.32 },
      false,
    ],
    [
      'sharp, rate, depth scale free',
      rateInput({ profile: 'sharp', parameters: { depthScale: free } }, 0.06),
      { edgeDepthNm: 60, levelTop: 0.1, levelBulk: 2 },
      true,
    ],
  ])('cover what they say: %s', (_, template, values, scatterScale) => {
    const { in68, in95 } = coverageOf(template, values, scatterScale);
    const within = (share: number, stated: number): void => {
      expect(Math.abs(share - stated), `${share} of scans for ${stated}`).toBeLessThan(
        3 * Math.sqrt((stated * (1 - stated)) / SCANS),
      );
    };
    within(in68, 0.6827);
    within(in95, 0.95);
  });
});
