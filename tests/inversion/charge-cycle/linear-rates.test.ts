import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  linearRates,
  type ScanSums,
  type TotalSums,
} from '@/lib/inversion/charge-cycle/linear-rates';

/** Scans of rates y against shares g of [0, 1], σ = 1, rates of either sign so that bounds are met. */
const series = fc.array(
  fc.array(
    fc.tuple(
      fc.double({ min: 0.01, max: 1, noNaN: true }),
      fc.double({ min: -1, max: 3, noNaN: true }),
    ),
    { minLength: 2, maxLength: 6 },
  ),
  { minLength: 1, maxLength: 5 },
);

function sumsOf(scans: readonly (readonly (readonly [number, number])[])[]): {
  sums: ScanSums[];
  total: TotalSums;
} {
  const sums = scans.map((scan) =>
    scan.reduce((sum, [g, y]) => ({ gg: sum.gg + g * g, g1: sum.g1 + g, gy: sum.gy + g * y }), {
      gg: 0,
      g1: 0,
      gy: 0,
    }),
  );
  const total = scans
    .flat()
    .reduce((sum, [, y]) => ({ ones: sum.ones + 1, y: sum.y + y, yy: sum.yy + y * y }), {
      ones: 0,
      y: 0,
      yy: 0,
    });
  return { sums, total };
}

describe('rates for given ν and E_A', () => {
  it('meet the conditions of the bounded minimum (Karush, Kuhn and Tucker)', () => {
    fc.assert(
      fc.property(series, (scans) => {
        const { sums, total } = sumsOf(scans);
        const { baseline, captures, chiSquare } = linearRates(sums, total, null);
        let direct = 0;
        let byBaseline = 0;
        scans.forEach((scan, i) => {
          let byCapture = 0;
          for (const [g, y] of scan) {
            const residual = y - baseline - captures[i]! * g;
            direct += residual * residual;
            byBaseline -= residual;
            byCapture -= g * residual;
          }
          if (captures[i]! > 0) expect(Math.abs(byCapture)).toBeLessThan(1e-8);
          else expect(byCapture).toBeGreaterThan(-1e-8);
        });
        // Slopes below 1e-12 of Σw count as flat, so λ₀ may stay off by what costs nothing.
        if (baseline > 0) expect(Math.abs(byBaseline)).toBeLessThan(1e-6);
        else expect(byBaseline).toBeGreaterThan(-1e-6);
        expect(Math.abs(chiSquare - direct)).toBeLessThan(1e-8);
      }),
      { numRuns: 500 },
    );
  });

  it('keep a held background', () => {
    const { sums, total } = sumsOf([
      [
        [1, 2],
        [0.5, 1],
      ],
    ]);
    const { baseline, captures } = linearRates(sums, total, 0.5);
    expect(baseline).toBe(0.5);
    expect(captures[0]).toBeCloseTo((1.5 + 0.25) / 1.25, 12);
  });
});
