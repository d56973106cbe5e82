import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createStoppingProfile, type StoppingProfile } from '@/lib/inversion/index';
import { compileKernel } from '@/lib/inversion/fold/kernel';
import { compileRamps, hatDesign } from '@/lib/inversion/free-form/hat-design';
import { uniforms } from '../support/scans';
import { gap, knots } from './support/knots';

const runs = { numRuns: 100, seed: 20261201 };
const amount = fc.double({ min: 0, max: 5, noNaN: true });
const histogram = fc
  .record({
    firstNm: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 8, noNaN: true })),
    bins: fc.array(fc.tuple(gap, amount), { minLength: 2, maxLength: 14 }),
  })
  .filter(({ bins }) => bins.some(([, weight]) => weight > 0.01));
const capNm = fc.oneof(fc.constant(0), fc.double({ min: 0.1, max: 25, noNaN: true }));
const scale = fc.double({ min: 0.7, max: 1.4, noNaN: true });

function profileOf({
  firstNm,
  bins,
}: {
  firstNm: number;
  bins: [number, number][];
}): StoppingProfile {
  const positionsNm = bins.reduce(
    (edges, [width]) => [...edges, edges[edges.length - 1]! + width],
    [firstNm],
  );
  return createStoppingProfile({
    energyKeV: 5,
    positionsNm,
    positionsAre: 'edges',
    weights: bins.map(([, weight]) => weight),
    weightsAre: 'counts',
  });
}

function hatsOf(
  profiles: readonly StoppingProfile[],
  depths: readonly number[],
  cap: number,
  a: number,
): Float64Array {
  const out = {
    rows: profiles.length,
    columns: depths.length,
    values: new Float64Array(profiles.length * depths.length),
  };
  hatDesign(compileRamps(compileKernel(profiles)), Float64Array.from(depths), cap, a, out);
  return out.values;
}

/** u linear between knots, constant outside them. */
function linearAt(depths: readonly number[], u: readonly number[], x: number): number {
  const next = depths.findIndex((depth) => depth >= x);
  if (next <= 0) return next === 0 ? u[0]! : u[u.length - 1]!;
  const t = (x - depths[next - 1]!) / (depths[next]! - depths[next - 1]!);
  return (1 - t) * u[next - 1]! + t * u[next]!;
}

/** ∫ρ·u below the cap by two-point Gauss-Legendre on each piece between bin edges and knots, where the integrand is linear. */
function byQuadrature(
  { edgesNm, mass }: StoppingProfile,
  depths: readonly number[],
  u: readonly number[],
  cap: number,
  a: number,
): number {
  let sum = 0;
  for (let b = 0; b < mass.length; b++) {
    const left = edgesNm[b]! * a - cap;
    const right = edgesNm[b + 1]! * a - cap;
    const cuts = [left, 0, ...depths, right]
      .filter((x) => x >= left && x <= right && x >= 0)
      .sort((x, y) => x - y);
    for (let c = 1; c < cuts.length; c++) {
      const middle = (cuts[c]! + cuts[c - 1]!) / 2;
      const half = (cuts[c]! - cuts[c - 1]!) / 2;
      for (const node of [-1, 1])
        sum +=
          ((mass[b]! * half) / (right - left)) *
          linearAt(depths, u, middle + (node * half) / Math.sqrt(3));
    }
  }
  return sum;
}

describe('the fold of a profile that is linear between knots', () => {
  // Source: quadrature that is exact on each piece. Second differences of ramps as deep as 300 nm over gaps of 0.05 nm lose
  // 1e-16·300/0.05.
  it('is exact for every hat, cap and depth scale', () => {
    fc.assert(
      fc.property(histogram, knots, capNm, scale, (table, depths, cap, a) => {
        const profile = profileOf(table as { firstNm: number; bins: [number, number][] });
        const hats = hatsOf([profile], depths, cap, a);
        depths.forEach((_, j) => {
          const hat = depths.map((__, k) => (k === j ? 1 : 0));
          expect(Math.abs(hats[j]! - byQuadrature(profile, depths, hat, cap, a))).toBeLessThan(
            2e-12,
          );
        });
        // All hats together see every muon that passed the cap once.
        const passed = hats.reduce((sum, value) => sum + value, 0);
        const ones = depths.map(() => 1);
        expect(Math.abs(passed - byQuadrature(profile, depths, ones, cap, a))).toBeLessThan(2e-12);
      }),
      runs,
    );
  });

  it('is linear in the values at the knots', () => {
    fc.assert(
      fc.property(histogram, knots, capNm, scale, fc.integer(), (table, depths, cap, a, seed) => {
        const profile = profileOf(table as { firstNm: number; bins: [number, number][] });
        const { between } = uniforms(seed);
        const u = depths.map(() => between(-2, 2));
        const hats = hatsOf([profile], depths, cap, a);
        const folded = hats.reduce((sum, value, j) => sum + value * u[j]!, 0);
        expect(Math.abs(folded - byQuadrature(profile, depths, u, cap, a))).toBeLessThan(1e-11);
      }),
      runs,
    );
  });

  it('does not change when a bin is split', () => {
    fc.assert(
      fc.property(
        histogram,
        knots,
        capNm,
        scale,
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        fc.nat(),
        (table, depths, cap, a, share, which) => {
          const bins = table.bins as [number, number][];
          const b = which % bins.length;
          const [width, weight] = bins[b]!;
          const split = [
            ...bins.slice(0, b),
            [width * share, weight * share] as [number, number],
            [width * (1 - share), weight * (1 - share)] as [number, number],
            ...bins.slice(b + 1),
          ];
          const whole = hatsOf([profileOf({ firstNm: table.firstNm, bins })], depths, cap, a);
          const parts = hatsOf(
            [profileOf({ firstNm: table.firstNm, bins: split })],
            depths,
            cap,
            a,
          );
          whole.forEach((value, j) => expect(Math.abs(value - parts[j]!)).toBeLessThan(2e-12));
        },
      ),
      runs,
    );
  });
});
