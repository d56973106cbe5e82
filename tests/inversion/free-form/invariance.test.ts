import { describe, expect, it } from 'vitest';
import {
  createStoppingSet,
  freeFormAt,
  prepareFreeForm,
  type FreeFormInput,
} from '@/lib/inversion/index';
import { heldAt } from '../support/scans';
import { largestDifference } from './support/compare';
import { freeRate, withValues } from './support/inputs';

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

describe('a point that is switched off', () => {
  // Rows of a covariance that are out of use are integrated out: what is left is the block of the others.
  it('counts as little as one that was never measured, and keeps its residual', () => {
    const n = VALUES.length;
    const covariance = Array.from({ length: n }, (_, i) =>
      Array.from({ length: n }, (__, j) => 0.05 ** 2 * (i === j ? 1 : 0.7 ** Math.abs(i - j))),
    );
    const whole = { ...withValues(freeRate(), VALUES), covariance };
    const off = {
      ...whole,
      points: whole.points.map((point, i) => ({ ...point, enabled: i !== 4 })),
    };
    const without = {
      ...whole,
      points: whole.points.filter((_, i) => i !== 4),
      covariance: covariance.filter((_, i) => i !== 4).map((row) => row.filter((_, j) => j !== 4)),
    };
    const [a, b] = [off, without].map((input) => freeFormAt(prepareFreeForm(input), 50));
    expect(largestDifference(a!.unknowns, b!.unknowns)).toBeLessThan(1e-10);
    expect(a!.chiSquare).toBeCloseTo(b!.chiSquare, 10);
    expect(a!.residuals.length).toBe(n);
    expect(a!.residuals[4]!.enabled).toBe(false);
    expect(freeFormAt(prepareFreeForm(whole), 50).chiSquare).not.toBeCloseTo(b!.chiSquare, 4);
  });
});
