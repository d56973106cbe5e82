import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import erfc from '@stdlib/math-base-special-erfc';
import { normalInto } from '@/lib/inversion/statistics/normal-table';
import { chiSquareUpperTail } from '@/lib/inversion/statistics/chi-square';

function normal(t: number): { cdf: number; pdf: number } {
  const cdf = new Float64Array(1);
  const pdf = new Float64Array(1);
  normalInto(t, cdf, pdf, 0);
  return { cdf: cdf[0]!, pdf: pdf[0]! };
}

describe('the normal distribution', () => {
  // Source: Abramowitz and Stegun, Handbook of Mathematical Functions (1964), table 7.1; from memory, ten digits.
  it.each([
    [0.5, 0.5204998778],
    [1.0, 0.8427007929],
    [1.5, 0.9661051465],
    [2.0, 0.995322265],
  ])('gives erf %s of table 7.1', (x, erf) => {
    expect(1 - erfc(x)).toBeCloseTo(erf, 10);
    expect(2 * normal(x * Math.SQRT2).cdf - 1).toBeCloseTo(erf, 10);
  });

  // Source: Abramowitz and Stegun (1964), table 26.1; from memory, thirteen digits.
  it.each([
    [0, 0.5, 0.3989422804014],
    [1, 0.8413447460685, 0.2419707245191],
    [2, 0.9772498680518, 0.0539909665132],
    [3, 0.9986501019684, 0.0044318484119],
  ])('gives the distribution and density at %s of table 26.1', (t, cdf, pdf) => {
    expect(normal(t).cdf).toBeCloseTo(cdf, 10);
    expect(normal(t).pdf).toBeCloseTo(pdf, 10);
  });

  // Source: mpmath at 30 digits (fixtures/reference/inversion/normal.json). Tolerance: two units of rounding of a number near 1.
  it('agrees with mpmath to 4e-16 everywhere', () => {
    const { rows } = JSON.parse(
      readFileSync('fixtures/reference/inversion/normal.json', 'utf8'),
    ) as { rows: [number, number, number][] };
    expect(rows.length).toBeGreaterThan(150);
    for (const [t, cdf, pdf] of rows) {
      expect(Math.abs(normal(t).cdf - cdf), `cdf at ${t}`).toBeLessThan(4e-16);
      expect(Math.abs(normal(t).pdf - pdf), `pdf at ${t}`).toBeLessThan(4e-16);
    }
  });

  it('is 0 and 1 outside its table and refuses nothing', () => {
    expect(normal(-50)).toEqual({ cdf: 0, pdf: 0 });
    expect(normal(50)).toEqual({ cdf: 1, pdf: 0 });
  });

  // Source: Abramowitz and Stegun (1964), table 26.8: χ² exceeded with probability 0.05 and 0.001; from memory, five digits.
  it.each([
    [3.84146, 1, 0.05],
    [16.919, 9, 0.05],
    [10.828, 1, 0.001],
    [27.877, 9, 0.001],
  ])('gives the upper tail of χ² %s with %s degrees of freedom', (x, nu, tail) => {
    expect(chiSquareUpperTail(x, nu) / tail).toBeCloseTo(1, 3);
  });

  // Source: for two degrees of freedom the tail is exp(−x/2) exactly; 1 − cdf would give 0 here.
  it('keeps its digits far out in the tail', () => {
    expect(chiSquareUpperTail(200, 2) / Math.exp(-100)).toBeCloseTo(1, 10);
  });
});
