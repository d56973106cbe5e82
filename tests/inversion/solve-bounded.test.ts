import { describe, expect, it } from 'vitest';
import { solveBounded } from '@/lib/inversion/fit/solve-bounded';
import { uniforms } from './support/scans';

/** Source: cyclic coordinate descent, which ends at the minimum of a positive definite quadratic over a box (Luo and Tseng 1992). */
function byDescent(
  n: number,
  gram: Float64Array,
  moment: Float64Array,
  lower: Float64Array,
  upper: Float64Array,
  held: Uint8Array,
  start: Float64Array,
): Float64Array {
  const c = Float64Array.from(start);
  for (let sweep = 0; sweep < 5000; sweep++) {
    for (let k = 0; k < n; k++) {
      if (held[k]) continue;
      let rest = moment[k]!;
      for (let l = 0; l < n; l++) if (l !== k) rest -= gram[k * n + l]! * c[l]!;
      c[k] = Math.min(Math.max(rest / gram[k * n + k]!, lower[k]!), upper[k]!);
    }
  }
  return c;
}

describe('bounded linear least squares', () => {
  it.each([1, 2, 3])('has the exact minimum for %i unknowns, inside and on every face', (n) => {
    const random = uniforms(90 + n);
    let onFace = 0;
    for (let trial = 0; trial < 200; trial++) {
      const rows = Array.from({ length: 6 }, () =>
        Array.from({ length: n }, () => random.between(-1, 1)),
      );
      const target = rows.map(() => random.between(-2, 2));
      const gram = new Float64Array(n * n);
      const moment = new Float64Array(n);
      rows.forEach((row, i) => {
        for (let k = 0; k < n; k++) {
          moment[k] = moment[k]! + row[k]! * target[i]!;
          for (let l = 0; l < n; l++) gram[k * n + l] = gram[k * n + l]! + row[k]! * row[l]!;
        }
      });
      const lower = Float64Array.from({ length: n }, () => random.between(-1, 0.2));
      const upper = Float64Array.from(lower, (low) =>
        random.next() < 0.2 ? Infinity : low + random.between(0.1, 1.5),
      );
      const held = Uint8Array.from({ length: n }, () => (random.next() < 0.15 ? 1 : 0));
      const start = Float64Array.from(lower, (low) => low + 0.05);
      const c = Float64Array.from(start);
      const value = solveBounded(n, gram, moment, lower, upper, 0, held, 0, c);
      const expected = byDescent(n, gram, moment, lower, upper, held, start);
      let expectedValue = 0;
      for (let k = 0; k < n; k++) {
        expect(c[k]!).toBeCloseTo(expected[k]!, 6);
        expectedValue -= 2 * moment[k]! * expected[k]!;
        for (let l = 0; l < n; l++) expectedValue += gram[k * n + l]! * expected[k]! * expected[l]!;
        if (!held[k] && (c[k] === lower[k] || c[k] === upper[k])) onFace++;
      }
      expect(value).toBeCloseTo(expectedValue, 9);
    }
    expect(onFace).toBeGreaterThan(50);
  });

  it('gives an unknown that no datum determines the fallback, inside its bounds', () => {
    const c = new Float64Array(2);
    const solve = (fallback: number): number[] => {
      solveBounded(
        2,
        Float64Array.of(4, 0, 0, 0),
        Float64Array.of(2, 0),
        Float64Array.of(0, 0),
        Float64Array.of(1, 1),
        0,
        Uint8Array.of(0, 0),
        fallback,
        c,
      );
      return [...c];
    };
    expect(solve(0.7)).toEqual([0.5, 0.7]);
    expect(solve(7)).toEqual([0.5, 1]);
  });
});
