import { describe, expect, it } from 'vitest';
import { coverageOf, type CoverageSetting } from './support/coverage';
import { fractionInput, free, freeWith, rateInput } from './support/scans';

const SCANS = 300;

const SETTINGS: CoverageSetting[] = [
  {
    name: 'graded, fraction, depth scale held',
    input: fractionInput({}, 0.006),
    truth: { edgeDepthNm: 75, edgeWidthNm: 18, levelTop: 0.74, levelBulk: 0.32 },
  },
  {
    name: 'sharp, rate, depth scale free',
    input: rateInput({ profile: 'sharp', parameters: { depthScale: freeWith(1, 0.03) } }, 0.06),
    truth: { edgeDepthNm: 60, levelTop: 0.1, levelBulk: 2 },
  },
  {
    name: 'graded, rate, depth scale free, priors on the levels',
    input: rateInput(
      {
        parameters: {
          edgeWidthNm: free,
          depthScale: freeWith(1, 0.03),
          levelTop: freeWith(0.1, 0.02),
          levelBulk: freeWith(2, 0.1),
        },
      },
      0.06,
    ),
    truth: { edgeDepthNm: 70, edgeWidthNm: 16 },
  },
];

/** Source: the meaning of a confidence interval. Tolerance: three standard errors of a share of 300 scans. */
function expectShare(count: number, stated: number): void {
  const share = count / SCANS;
  expect(Math.abs(share - stated), `${share} of scans for ${stated}`).toBeLessThan(
    3 * Math.sqrt((stated * (1 - stated)) / SCANS),
  );
}

// Many more scans and settings: npm run coverage-study.
describe('the intervals hold the truth as often as they say', () => {
  it.each(SETTINGS.map((setting, k) => [setting.name, setting, k] as const))(
    '%s',
    (_, setting, k) => {
      const { noMinimum, notConverged, edge68, edge95, widthLimit } = coverageOf(
        setting,
        SCANS,
        1000 * (k + 1),
      );
      expect(noMinimum + notConverged).toBe(0);
      expectShare(edge68, 0.6827);
      expectShare(edge95, 0.95);
      // Half of what a 95 % interval leaves out lies above its upper end.
      if (widthLimit !== null) expectShare(widthLimit, 0.975);
    },
  );
});
