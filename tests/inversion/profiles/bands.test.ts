import { describe, expect, it } from 'vitest';
import {
  bootstrapBands,
  carrierProfile,
  defaultDepthGrid,
  fit,
  prepareFit,
  resample,
  simulateScan,
} from '@/lib/inversion/index';
import { answerOf } from '../support/scans';
import { PROFILE_CASES } from './support';

const COUNT = 40;

describe('bands of every profile', () => {
  // What a band must obey whatever the profile: nested, finite, about the value of the fit where the flag says supported.
  it.each(PROFILE_CASES.map((one) => [one.name, one] as const))('%s', (_, { input, values }) => {
    const points = simulateScan({ input, values, seed: 11 });
    const depthScale = { held: true, value: values.depthScale ?? 1, prior: null };
    const bulkPerCm3 = input.parameters.bulkPerCm3
      ? { held: false, value: null, prior: { mean: 2e16, sigma: 1e15 } }
      : undefined;
    const parameters = { depthScale, ...(bulkPerCm3 ? { bulkPerCm3 } : {}) };
    const prepared = prepareFit({ ...input, points, parameters });
    const outcome = fit(prepared, { intervalsFor: [] });
    if (outcome.status === 'no-minimum') return;
    const answer = answerOf(outcome);
    const depths = Array.from(defaultDepthGrid(prepared, answer)).filter((__, k) => k % 10 === 0);
    const rows = resample(prepared, answer, { seed: 2, first: 0, count: COUNT });
    const bands = bootstrapBands(prepared, answer, rows, depths);
    const profile = carrierProfile(prepared, answer, bands);
    expect(profile.bands).toBe('bootstrap');
    profile.points.forEach(({ value, lower68, upper68, lower95, upper95 }) => {
      for (const number of [value, lower68, upper68, lower95, upper95])
        expect(Number.isFinite(number)).toBe(true);
      expect(lower95!).toBeLessThanOrEqual(lower68!);
      expect(lower68!).toBeLessThanOrEqual(upper68!);
      expect(upper68!).toBeLessThanOrEqual(upper95!);
    });
    // Blocks may be drawn by different threads, and in any order.
    const half = resample(prepared, answer, { seed: 2, first: COUNT / 2, count: COUNT / 2 });
    expect([...half]).toEqual([...rows.slice(rows.length / 2)]);
    const quick = carrierProfile(prepared, answer, null, { depthsNm: depths });
    quick.points.forEach(({ lower95, value, upper95 }) => {
      if (lower95 === null) return;
      expect(lower95).toBeLessThanOrEqual(value * (1 + 1e-12) + 1e-12);
      expect(upper95!).toBeGreaterThanOrEqual(value * (1 - 1e-12) - 1e-12);
    });
  });
});
