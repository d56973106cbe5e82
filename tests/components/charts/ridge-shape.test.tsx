import { describe, expect, it } from 'vitest';

import { ridgePoints, ridgeQuantile } from '@/components/charts/ridge-shape';

/** Uniform between 0 and 100 nm in four bins: every number below follows by hand. */
const uniform = { energyKeV: 5, edgesNm: [0, 10, 50, 60, 100], mass: [0.1, 0.4, 0.1, 0.4] };

describe('a ridge on an even grid', () => {
  it('keeps the mass and the density', () => {
    const points = ridgePoints(uniform, [0, 200], 40);
    const step = 5;
    expect(points.reduce((sum, { density }) => sum + density * step, 0)).toBeCloseTo(1, 12);
    expect(points[3]?.density).toBeCloseTo(0.01, 12);
    expect(points[39]?.density).toBe(0);
  });

  it('counts depth below the cap and scales it: depth = scale·x − cap', () => {
    // Scaled by 1.1 the ridge ends at 110 nm in the stack, 85 nm below a cap of 25 nm.
    const points = ridgePoints(uniform, [0, 200], 200, { depthScale: 1.1, capThicknessNm: 25 });
    expect(points.find(({ density }) => density < 1e-9)?.depthNm).toBeCloseTo(85.5, 12);
    const inside = points.reduce((sum, { density }) => sum + density, 0);
    expect(inside).toBeCloseTo(85 / 110, 10);
  });
});

describe('quantile of a ridge', () => {
  it('is linear within a bin', () => {
    expect(ridgeQuantile(uniform, 0.3)).toBeCloseTo(30, 12);
    expect(ridgeQuantile(uniform, 0.99)).toBeCloseTo(99, 12);
  });
});
