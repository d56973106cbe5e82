import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { inverse, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { optimalDesign, type DesignProblem } from '@/lib/inversion/planning/c-optimal';
import { wholeSteps } from '@/lib/inversion/planning/whole-steps';
import { uniforms } from '../support/scans';

/** cᵀ(M₀ + Σ t a aᵀ)⁻¹c by inverting outright: apart from the library, which never does. */
function varianceOf(
  { covariance, index, vectors }: DesignProblem,
  hours: ArrayLike<number>,
): number {
  const information = inverse(new Matrix(covariance.map((row) => [...row])));
  vectors.forEach((vector, k) => {
    const column = Matrix.columnVector([...vector]);
    information.add(Matrix.mul(column.mmul(column.transpose()), hours[k]!));
  });
  return inverse(information).get(index, index);
}

/** A random problem: covariance BBᵀ + 0.1·1, vectors with components in −1 … 1. */
function problemOf(seed: number, size: number, count: number): DesignProblem {
  const { between, pick } = uniforms(seed);
  const b = Array.from({ length: size }, () => Array.from({ length: size }, () => between(-1, 1)));
  const covariance = b.map((row, i) =>
    b.map(
      (other, j) => row.reduce((sum, value, l) => sum + value * other[l]!, 0) + (i === j ? 0.1 : 0),
    ),
  );
  return {
    covariance,
    index: pick(Array.from({ length: size }, (_, k) => k)),
    vectors: Array.from({ length: count }, () =>
      Float64Array.from({ length: size }, () => between(-1, 1)),
    ),
  };
}

/** A random split: exponential deviates over their sum. */
function splitOf(seed: number, count: number, hours: number): number[] {
  const { next } = uniforms(seed);
  const parts = Array.from({ length: count }, () => (-Math.log(1 - next())) ** 3);
  const total = parts.reduce((a, b) => a + b, 0);
  return parts.map((part) => (part * hours) / total);
}

const problems = fc.record({
  seed: fc.integer({ min: 1, max: 1e6 }),
  size: fc.integer({ min: 1, max: 5 }),
  count: fc.integer({ min: 1, max: 12 }),
  hours: fc.double({ min: 0.1, max: 100, noNaN: true }),
});

describe('the c-optimal split', () => {
  // Source: the straight line y = θ₀ + θ₁x on [−1, 1] (G. Elfving, Ann. Math. Stat. 23, 255, 1952; V. V. Fedorov, Theory of
  // Optimal Experiments, 1972): the slope wants half the time at either end and has variance 1/H; the value at x₀ > 1 wants
  // (x₀ + 1)/2x₀ of it at 1 and (x₀ − 1)/2x₀ at −1 and has variance x₀²/H (Hoel and Levine, Ann. Math. Stat. 35, 1553, 1964, the
  // case of a line). A present covariance of 1e9 stands for no knowledge: it changes the seventh digit.
  it.each([
    ['slope', Infinity, 0.5, 1],
    ['value at 1.5', 1.5, 2.5 / 3, 2.25],
    ['value at 3', 3, 4 / 6, 9],
  ])('is the textbook one for a straight line: %s', (_, x0, shareAtOne, variance) => {
    const nothing = 1e9;
    // Parameters: the value at x₀ and the slope; or θ₀ and θ₁.
    const shift = x0 === Infinity ? 0 : x0;
    const problem = {
      covariance: [
        [nothing * (1 + shift ** 2), nothing * shift],
        [nothing * shift, nothing],
      ],
      index: x0 === Infinity ? 1 : 0,
      vectors: [-1, -0.8, -0.3, 0, 0.2, 0.9, 1].map((x) => Float64Array.of(1, x - shift)),
    };
    const hours = 5;
    const design = optimalDesign(problem, hours);
    [1 - shareAtOne, 0, 0, 0, 0, 0, shareAtOne].forEach((share, k) =>
      expect(design.hours[k]! / hours).toBeCloseTo(share, 6),
    );
    expect(design.variance * hours).toBeCloseTo(variance, 6);
  });

  // Source: SciPy's SLSQP from eight random splits each (tests/reference/c_optimal.py). Tolerance: the certificate of 1e-9; seen:
  // equal to 15 digits.
  it('is the one that SciPy finds', () => {
    const { problems: cases } = JSON.parse(
      readFileSync('fixtures/reference/planning/c-optimal.json', 'utf8'),
    ) as { problems: (DesignProblem & { hours: number; variance: number })[] };
    expect(cases).toHaveLength(6);
    for (const { vectors, hours, variance, ...rest } of cases) {
      const problem = { ...rest, vectors: vectors.map((vector) => Float64Array.from(vector)) };
      const found = optimalDesign(problem, hours).variance;
      expect(found / variance).toBeLessThan(1 + 1e-9);
      expect(found / variance).toBeGreaterThan(1 - 1e-9);
    }
  });

  it('adds up, is certified, and its variance is what the split gives', () => {
    fc.assert(
      fc.property(problems, ({ seed, size, count, hours }) => {
        const once = problemOf(seed, size, count);
        // Every energy twice, and once the other way round: slopes that are equal from the start.
        const vectors = once.vectors.flatMap((vector) => [vector, vector, vector.map((x) => -x)]);
        const problem = { ...once, vectors };
        const design = optimalDesign(problem, hours);
        expect(design.variance / optimalDesign(once, hours).variance).toBeCloseTo(1, 8);
        expect(design.hours.every((t) => t >= 0)).toBe(true);
        expect(design.hours.reduce((a, b) => a + b, 0) / hours).toBeCloseTo(1, 10);
        expect(design.gap).toBeLessThanOrEqual(1e-9 * design.variance);
        expect(varianceOf(problem, design.hours) / design.variance).toBeCloseTo(1, 8);
      }),
      { numRuns: 100, seed: 1 },
    );
  });

  // Source: the variance is convex in the times, so the split found is best among all. Tolerance: 1e-8, rounding of the outright
  // inverse.
  it('is not beaten by any random split, near or far', () => {
    fc.assert(
      fc.property(problems, fc.integer({ min: 1, max: 1e6 }), (shape, other) => {
        const { seed, size, count, hours } = shape;
        const problem = problemOf(seed, size, count);
        const design = optimalDesign(problem, hours);
        const random = splitOf(other, count, hours);
        for (const t of [1, 0.1, 0.001]) {
          const mixed = random.map((part, k) => t * part + (1 - t) * design.hours[k]!);
          expect(varianceOf(problem, mixed)).toBeGreaterThan(design.variance * (1 - 1e-8));
        }
      }),
      { numRuns: 100, seed: 2 },
    );
  });

  it('is the best of a convex variance', () => {
    fc.assert(
      fc.property(
        problems,
        fc.integer({ min: 1, max: 1e6 }),
        ({ seed, size, count, hours }, other) => {
          const problem = problemOf(seed, size, count);
          const a = splitOf(other, count, hours);
          const b = splitOf(other + 1, count, hours);
          const middle = a.map((part, k) => (part + b[k]!) / 2);
          const mean = (varianceOf(problem, a) + varianceOf(problem, b)) / 2;
          expect(varianceOf(problem, middle)).toBeLessThanOrEqual(mean * (1 + 1e-9));
        },
      ),
      { numRuns: 60, seed: 3 },
    );
  });

  // Source: all splits in 40ths of the time among three candidates. The best of them lies above the optimum, and no further than
  // one part in a hundred: half a step of 1/40 either way changes a variance by the square of a few hundredths.
  it('agrees with brute force over a grid of splits', () => {
    for (let seed = 1; seed <= 12; seed++) {
      const problem = problemOf(seed, 3, 3);
      const { variance } = optimalDesign(problem, 4);
      let lowest = Infinity;
      for (let i = 0; i <= 40; i++)
        for (let j = 0; j <= 40 - i; j++)
          lowest = Math.min(
            lowest,
            varianceOf(
              problem,
              [i, j, 40 - i - j].map((n) => n / 10),
            ),
          );
      expect(lowest / variance).toBeGreaterThan(1 - 1e-8);
      expect(lowest / variance).toBeLessThan(1.01);
    }
  });
});

describe('a split in whole steps', () => {
  // Source: all ways to give 7 steps to 4 candidates.
  it('is the best of all of them on 30 random problems', () => {
    for (let seed = 1; seed <= 30; seed++) {
      const problem = problemOf(seed, 3, 4);
      const { hours, variance } = wholeSteps(problem, optimalDesign(problem, 3.5).hours, 0.5, 7);
      let lowest = Infinity;
      for (let i = 0; i <= 7; i++)
        for (let j = 0; j <= 7 - i; j++)
          for (let k = 0; k <= 7 - i - j; k++)
            lowest = Math.min(
              lowest,
              varianceOf(
                problem,
                [i, j, k, 7 - i - j - k].map((n) => n / 2),
              ),
            );
      expect(hours.reduce((a, b) => a + b, 0)).toBeCloseTo(3.5, 12);
      expect(hours.every((t) => Number.isInteger(2 * t))).toBe(true);
      expect(variance / lowest, `problem ${seed}`).toBeCloseTo(1, 8);
    }
  });
});
