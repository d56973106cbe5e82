import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  createStoppingProfile,
  createStoppingSet,
  differenceOperator,
  freeFormAt,
  prepareFreeForm,
  type FreeFormInput,
  type StoppingProfile,
} from '@/lib/inversion/index';
import { compileKernel } from '@/lib/inversion/fold/kernel';
import { compileRamps, hatDesign } from '@/lib/inversion/free-form/hat-design';
import { heldAt, uniforms } from '../support/scans';
import { freeRate, withValues } from './support/inputs';
import { largestDifference } from './support/compare';

const runs = { numRuns: 100, seed: 20261201 };
const amount = fc.double({ min: 0, max: 5, noNaN: true });
const gap = fc.double({ min: 0.05, max: 20, noNaN: true });

const histogram = fc
  .record({
    firstNm: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 8, noNaN: true })),
    bins: fc.array(fc.tuple(gap, amount), { minLength: 2, maxLength: 14 }),
  })
  .filter(({ bins }) => bins.some(([, weight]) => weight > 0.01));
const knots = fc
  .record({
    firstNm: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 10, noNaN: true })),
    gaps: fc.array(gap, { minLength: 1, maxLength: 10 }),
  })
  .map(({ firstNm, gaps }) =>
    gaps.reduce((depths, step) => [...depths, depths[depths.length - 1]! + step], [firstNm]),
  );
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
  // Source: quadrature that is exact on each piece. Second differences of ramps as deep as 300 nm over gaps of 0.05 nm lose 1e-16·300/0.05.
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

describe('the differences over uneven knots', () => {
  // Source: ∫(u′)² dx of a function linear between knots, piece by piece; u″ = 2 for u = x², over the span between the middles of the end intervals.
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

const VALUES = [0.06, 0.05, 0.1, 0.13, 0.22, 0.4, 0.55, 0.66, 0.74, 0.83, 0.9, 0.91, 0.96];

describe('a free-form profile', () => {
  it('does not depend on the order of the energies, to the last bit', () => {
    const input = withValues(freeRate(), VALUES);
    const reversed: FreeFormInput = { ...input, points: [...input.points].reverse() };
    const [a, b] = [input, reversed].map((each) => freeFormAt(prepareFreeForm(each), 50));
    expect(b!.unknowns).toEqual(a!.unknowns);
    expect(b!.chiSquare).toBe(a!.chiSquare);
    expect([...b!.residuals].reverse()).toEqual(a!.residuals);
  });

  // χ² keeps when values, σ and Λ₀ grow by c and u with them; µ‖Lu‖² does with µ/c².
  it('scales with the unit of the data', () => {
    const input = withValues(freeRate({ difference: 2 }), VALUES);
    const c = 37;
    const scaled: FreeFormInput = {
      ...input,
      points: input.points.map((point) => ({
        ...point,
        value: c * point.value,
        sigma: c * point.sigma,
      })),
      response: {
        ...(input.response as { kind: 'capture-rate' } & typeof input.response),
        baselinePerUs: 0.01 * c,
      },
    };
    const plain = freeFormAt(prepareFreeForm(input), 5000);
    const other = freeFormAt(prepareFreeForm(scaled), 5000 / c ** 2);
    expect(
      largestDifference(
        other.unknowns,
        plain.unknowns.map((u) => c * u),
      ),
    ).toBeLessThan(1e-11);
    expect(other.chiSquare / plain.chiSquare).toBeCloseTo(1, 10);
  });

  // ‖Lu‖² has the unit of 1/length for the first difference and of 1/length³ for the second.
  it.each([1, 2] as const)(
    'scales with the unit of depth: difference of order %i',
    (difference) => {
      const input = withValues(freeRate({ difference }), VALUES);
      const k = 12.5;
      const scaled: FreeFormInput = {
        ...input,
        stopping: createStoppingSet(
          input.stopping.profiles.map((profile) => ({
            ...profile,
            edgesNm: profile.edgesNm.map((x) => k * x),
          })),
        ),
      };
      const plain = freeFormAt(prepareFreeForm(input), 300);
      const other = freeFormAt(prepareFreeForm(scaled), 300 * k ** (2 * difference - 1));
      expect(largestDifference(other.unknowns, plain.unknowns)).toBeLessThan(1e-9);
      expect(other.knotsNm[39]! / plain.knotsNm[39]!).toBeCloseTo(k, 12);
    },
  );

  it('keeps its cap level: held at what the free one finds, nothing moves', () => {
    const input = withValues(freeRate({ capThicknessNm: 8 }), VALUES);
    const free = freeFormAt(prepareFreeForm(input), 20);
    expect(free.levelCap).toBeGreaterThan(0);
    const held = freeFormAt(
      prepareFreeForm({ ...input, parameters: { levelCap: heldAt(free.levelCap!) } }),
      20,
    );
    expect(largestDifference(held.unknowns, free.unknowns)).toBeLessThan(1e-9);
    expect(held.chiSquare).toBeCloseTo(free.chiSquare, 9);
  });
});
