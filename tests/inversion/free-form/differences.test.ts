import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { differenceOperator } from '@/lib/inversion/index';
import { uniforms } from '../support/scans';
import { knots } from './support/knots';

const runs = { numRuns: 100, seed: 20261201 };

describe('the differences over uneven knots', () => {
  // Source: ∫(u′)² dx of a function linear between knots, piece by piece; u″ = 2 for u = x², over the span between the middles
  // of the end intervals.
  it('give ∫(u′)² exactly, and ∫(u″)² of a parabola exactly', () => {
    fc.assert(
      fc.property(
        knots.filter((depths) => depths.length > 2),
        fc.integer(),
        (depths, seed) => {
          const { between } = uniforms(seed);
          const u = depths.map(() => between(-1, 1));
          const exact = depths
            .slice(1)
            .reduce((sum, x, j) => sum + (u[j + 1]! - u[j]!) ** 2 / (x - depths[j]!), 0);
          expect(roughness(depths, u, 1) / exact).toBeCloseTo(1, 10);
          const last = depths.length - 1;
          const span = (depths[last]! + depths[last - 1]! - depths[0]! - depths[1]!) / 2;
          // Squares of depths to 200 nm over gaps of 0.05 nm, twice: 1e-16·200²/0.05².
          expect(
            roughness(
              depths,
              depths.map((x) => x * x),
              2,
            ) /
              (4 * span),
          ).toBeCloseTo(1, 6);
          expect(
            roughness(
              depths,
              depths.map((x) => 3 - 2 * x),
              2,
            ),
          ).toBeLessThan(1e-12 * span ** 2 + 1e-15);
        },
      ),
      runs,
    );
  });
});

function roughness(depths: readonly number[], u: readonly number[], order: 1 | 2): number {
  const { rows, columns, values } = differenceOperator(depths, order);
  let sum = 0;
  for (let i = 0; i < rows; i++) {
    let entry = 0;
    for (let j = 0; j < columns; j++) entry += values[j * rows + i]! * u[j]!;
    sum += entry * entry;
  }
  return sum;
}
