import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  createNonNegativeState,
  solveNonNegative,
  type LinearSystem,
  type NonNegativeState,
} from '@/lib/inversion/free-form/non-negative';
import { uniforms } from '../support/scans';
import { largestDifference } from './support/compare';

interface Drawn {
  system: LinearSystem;
  start: Float64Array;
}

/**
 * Random systems: dense, with zero blocks below, tall and wide, columns of very different size, b inside the cone or far from
 * it.
 */
const drawn = fc
  .record({
    seed: fc.integer(),
    columns: fc.integer({ min: 1, max: 12 }),
    extra: fc.integer({ min: 0, max: 8 }),
    banded: fc.boolean(),
    spread: fc.integer({ min: 0, max: 6 }),
    warm: fc.boolean(),
  })
  .map(({ seed, columns, extra, banded, spread, warm }): Drawn => {
    const { between, next } = uniforms(seed);
    const rows = columns + extra;
    const matrix = new Float64Array(rows * columns);
    const extent = new Int32Array(columns).fill(rows);
    for (let j = 0; j < columns; j++) {
      const size = 10 ** between(-spread / 2, spread / 2);
      if (banded) extent[j] = Math.min(rows, extra + j + 1);
      for (let i = 0; i < extent[j]!; i++) matrix[j * rows + i] = size * between(-1, 1);
    }
    return {
      system: {
        rows,
        columns,
        matrix,
        extent,
        b: Float64Array.from({ length: rows }, () => between(-1, 1)),
      },
      start: Float64Array.from({ length: columns }, () => (warm && next() < 0.6 ? next() : 0)),
    };
  });

function solve({ system, start }: Drawn): NonNegativeState & { status: string } {
  const state = createNonNegativeState(system.rows, system.columns);
  state.x.set(start);
  const status = solveNonNegative(system, state);
  return { ...state, status };
}

function norm(values: ArrayLike<number>): number {
  return Math.hypot(...Array.from(values));
}

function residualOf({ rows, columns, matrix, b }: LinearSystem, x: Float64Array): Float64Array {
  return b.map((value, i) => {
    let rest = value;
    for (let j = 0; j < columns; j++) rest -= matrix[j * rows + i]! * x[j]!;
    return rest;
  });
}

/**
 * Minimum by trying every set of zeros: each candidate by ordinary least squares (normal equations), the best feasible one
 * kept.
 */
function byEverySet({ rows, columns, matrix, b }: LinearSystem): number {
  let best = norm(b);
  for (let set = 1; set < 1 << columns; set++) {
    const chosen = Array.from({ length: columns }, (_, j) => j).filter((j) => set & (1 << j));
    const column = (j: number): Float64Array => matrix.subarray(j * rows, (j + 1) * rows);
    const dot = (p: ArrayLike<number>, q: ArrayLike<number>): number =>
      Array.from(p).reduce((sum, value, i) => sum + value * q[i]!, 0);
    const gram = chosen.map((j) => [
      ...chosen.map((k) => dot(column(j), column(k))),
      dot(column(j), b),
    ]);
    for (let k = 0; k < chosen.length; k++) {
      for (let r = k + 1; r < chosen.length; r++) {
        const factor = gram[r]![k]! / gram[k]![k]!;
        for (let c = k; c <= chosen.length; c++) gram[r]![c] = gram[r]![c]! - factor * gram[k]![c]!;
      }
    }
    const x = new Float64Array(columns);
    for (let k = chosen.length - 1; k >= 0; k--) {
      let sum = gram[k]![chosen.length]!;
      for (let c = k + 1; c < chosen.length; c++) sum -= gram[k]![c]! * x[chosen[c]!]!;
      x[chosen[k]!] = sum / gram[k]![k]!;
    }
    if (x.every((value) => value >= 0)) {
      const rest = b.map((value, i) =>
        chosen.reduce((sum, j) => sum - column(j)[i]! * x[j]!, value),
      );
      best = Math.min(best, norm(rest));
    }
  }
  return best;
}

describe('non-negative least squares', () => {
  // Source: the Kuhn-Tucker conditions, which are sufficient for a convex problem (Lawson and Hanson, chapter 23, theorem 23.4).
  // Each gradient entry is a sum of products of the size of its column and b: 1e-12 of that is rounding.
  it('meets the Kuhn-Tucker conditions from any start', () => {
    fc.assert(
      fc.property(drawn, (each) => {
        const { x, passive, count, status } = solve(each);
        expect(status).toBe('solved');
        const { rows, columns, matrix, b } = each.system;
        const positive = new Set(passive.slice(0, count));
        const rest = residualOf(each.system, x);
        // ‖A x‖ can exceed ‖b‖ in its parts.
        let size = norm(b);
        for (let j = 0; j < columns; j++)
          size += norm(matrix.subarray(j * rows, (j + 1) * rows)) * x[j]!;
        for (let j = 0; j < columns; j++) {
          const column = matrix.subarray(j * rows, (j + 1) * rows);
          const gradient = column.reduce((sum, value, i) => sum + value * rest[i]!, 0);
          const rounding = 1e-12 * norm(column) * size;
          expect(x[j]! >= 0).toBe(true);
          expect(x[j]! > 0).toBe(positive.has(j));
          expect(gradient).toBeLessThanOrEqual(rounding);
          if (x[j]! > 0) expect(gradient).toBeGreaterThanOrEqual(-rounding);
        }
      }),
      { numRuns: 400, seed: 20261201 },
    );
  });

  it('ends at the same place from every start', () => {
    fc.assert(
      fc.property(drawn, (each) => {
        const cold = solve({ ...each, start: new Float64Array(each.system.columns) });
        const warm = solve({ ...each, start: new Float64Array(each.system.columns).fill(1) });
        const size = Math.max(norm(cold.x), norm(warm.x));
        // Square dense systems of twelve columns can have a condition of 1e5 and more: the values are compared by what they do
        // to b.
        const [a, b] = [residualOf(each.system, cold.x), residualOf(each.system, warm.x)];
        expect(largestDifference(a, b) * norm(b)).toBeLessThan(1e-9 * (1 + size));
      }),
      { numRuns: 200, seed: 20261202 },
    );
  });

  it('finds what trying every set of zeros finds', () => {
    fc.assert(
      fc.property(
        drawn.filter(({ system }) => system.columns <= 7),
        (each) => {
          const found = norm(residualOf(each.system, solve(each).x));
          const best = byEverySet(each.system);
          // The trial by normal equations has half the digits of a near-singular set; a better set than the best cannot be.
          expect(found).toBeLessThan(best + 1e-7);
        },
      ),
      { numRuns: 120, seed: 20261203 },
    );
  });

  it('says so where the positive columns are dependent', () => {
    const matrix = Float64Array.of(1, 2, 3, 1, 2, 3);
    const system = {
      rows: 3,
      columns: 2,
      matrix,
      extent: Int32Array.of(3, 3),
      b: Float64Array.of(1, 1, 1),
    };
    expect(solve({ system, start: Float64Array.of(1, 1) }).status).toBe('dependent');
    // From the empty set the second column never enters: the first has taken all it could.
    const cold = solve({ system, start: Float64Array.of(0, 0) });
    expect(cold.status).toBe('solved');
    expect(cold.x[0]! + cold.x[1]!).toBeCloseTo(6 / 14, 12);
  });
});
