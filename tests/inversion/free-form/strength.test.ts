import { describe, expect, it } from 'vitest';
import {
  chooseStrength,
  createPenalisedWork,
  freeFormAt,
  prepareFreeForm,
  simulateScan,
  solveAtStrength,
  solveFreeForm,
  strengthCurve,
  strengthGrid,
  type FreeFormInput,
  type Monotonic,
} from '@/lib/inversion/index';
import { fractionInput } from '../support/scans';
import { freeFraction, freeRate, withValues } from './support/inputs';

const TRUTH = { edgeDepthNm: 78, edgeWidthNm: 16, levelTop: 0.74, levelBulk: 0.32 };

function scan(seed: number, change: Partial<FreeFormInput> = {}): FreeFormInput {
  return freeFraction({
    points: simulateScan({ input: fractionInput({}, 0.005), values: TRUTH, seed }),
    ...change,
  });
}

const KINDS = ([1, 2] as const).flatMap((difference) =>
  (['no', 'rising'] as const).map((monotonic: Monotonic) => ({ difference, monotonic })),
);

describe('the curve over the strength of the penalty', () => {
  it.each(KINDS)(
    'has χ² falling and roughness rising as the penalty weakens: $difference, $monotonic',
    (kind) => {
      for (let seed = 1; seed <= 4; seed++) {
        const { curve } = solveFreeForm(prepareFreeForm(scan(seed, kind)));
        expect(curve.length).toBe(40);
        for (let k = 1; k < curve.length; k++) {
          expect(curve[k]!.strength).toBeLessThan(curve[k - 1]!.strength);
          expect(curve[k]!.chiSquare).toBeLessThanOrEqual(curve[k - 1]!.chiSquare * (1 + 1e-9));
          expect(curve[k]!.roughness).toBeGreaterThanOrEqual(curve[k - 1]!.roughness * (1 - 1e-9));
        }
      }
    },
  );

  // Source: at the minimum neither x nor a multiplier changes Φ = χ² + µη² to first order, so dχ² = −µ dη², with the constraint
  // too.
  it.each(KINDS)('has dχ² = −µ d‖Lu‖² along it: $difference, $monotonic', (kind) => {
    const prepared = prepareFreeForm(scan(3, kind));
    for (const power of [-2, 0, 2, 4]) {
      const strength = 10 ** (power + (kind.difference === 2 ? 2 : 0));
      const [below, above] = [strength * (1 - 1e-4), strength * (1 + 1e-4)].map((s) =>
        freeFormAt(prepared, s),
      );
      const byChi = above!.chiSquare - below!.chiSquare;
      const byRoughness = above!.roughness ** 2 - below!.roughness ** 2;
      // Both differences are some 1e-6 of χ², which is good to 1e-13.
      if (byChi > 1e-8) expect(byChi / (-strength * byRoughness)).toBeCloseTo(1, 3);
    }
  });

  it('spans from what the penalty does not see to less than one degree of freedom', () => {
    for (const difference of [1, 2] as const) {
      const prepared = prepareFreeForm(scan(1, { difference }));
      const loose = { ...prepared.problem, nonNegative: false };
      const grid = strengthGrid(prepared.problem, prepared.dataCount);
      const curve = strengthCurve(loose, createPenalisedWork(loose, prepared.dataCount), grid);
      expect(curve[0]!.effectiveParameters).toBeLessThan(difference + 0.051);
      expect(curve[39]!.effectiveParameters).toBeGreaterThan(8);
      expect(Math.log(grid[1]! / grid[0]!)).toBeCloseTo(Math.log(grid[39]! / grid[38]!), 9);
    }
  });

  it('is the same whichever way it is walked: each point is the minimum, not a way to it', () => {
    for (const kind of KINDS) {
      const { problem, dataCount } = prepareFreeForm(scan(2, kind));
      const grid = Array.from(strengthGrid(problem, dataCount));
      const down = strengthCurve(problem, createPenalisedWork(problem, dataCount), grid);
      const up = strengthCurve(
        problem,
        createPenalisedWork(problem, dataCount),
        [...grid].reverse(),
      ).reverse();
      down.forEach((point, k) => {
        expect(up[k]!.chiSquare / point.chiSquare).toBeCloseTo(1, 8);
        expect(up[k]!.roughness / point.roughness).toBeCloseTo(1, 5);
      });
    }
  });
});

describe('the choice of the strength', () => {
  it.each(KINDS)(
    'by discrepancy has χ² at the number of points: $difference, $monotonic',
    (kind) => {
      for (let seed = 1; seed <= 6; seed++) {
        const answer = solveFreeForm(prepareFreeForm(scan(seed, kind)));
        const { strength } = answer.choices.discrepancy;
        expect(strength).not.toBe(null);
        expect(answer.strength).toBe(strength);
        expect(answer.chiSquare / 13).toBeCloseTo(1, 10);
      }
    },
  );

  it('by cross-validation is nowhere worse than a fine walk over the same range', () => {
    for (const kind of KINDS) {
      const { problem, dataCount } = prepareFreeForm(scan(2, kind));
      const work = createPenalisedWork(problem, dataCount);
      const grid = strengthGrid(problem, dataCount);
      const curve = strengthCurve(problem, work, grid);
      const { strength } = chooseStrength(problem, work, curve).gcv;
      solveAtStrength(problem, work, strength!);
      const chosen = work.point.gcv;
      for (const point of curve) expect(chosen).toBeLessThanOrEqual(point.gcv * (1 + 1e-9));
    }
  });

  it('can be the caller’s, or another rule’s', () => {
    const prepared = prepareFreeForm(scan(1));
    const own = solveFreeForm(prepared, { strength: 123 });
    expect([own.strength, own.chosenBy]).toEqual([123, 'caller']);
    for (const rule of ['gcv', 'corner', 'discrepancy'] as const) {
      const answer = solveFreeForm(prepared, { strength: rule });
      expect([answer.strength, answer.chosenBy]).toEqual([own.choices[rule].strength, rule]);
    }
    const few = solveFreeForm(prepared, { strengths: [10, 1000, 100, 1e5] });
    expect(few.curve.map(({ strength }) => strength)).toEqual([1e5, 1000, 100, 10]);
  });

  it('says where no strength makes χ² the number of points, and takes the smoothest, or leaves the choice to another rule', () => {
    // A constant: the smoothest profile hits every point.
    const flat = freeRate();
    const constant = solveFreeForm(
      prepareFreeForm(
        withValues(
          flat,
          flat.points.map(() => 2),
        ),
      ),
    );
    expect(constant.strength).toBe(constant.curve[0]!.strength);
    expect(constant.choices.discrepancy.note).toMatch(/even the smoothest/);
    expect(constant.chosenBy).toBe('discrepancy');
    expect(constant.chiSquare).toBeLessThan(1e-9);
    // Points that scatter by forty σ from one energy to the next: no profile can do that.
    const scatter = solveFreeForm(
      prepareFreeForm(
        withValues(
          flat,
          flat.points.map((_, i) => 3 + (i % 2 ? 2 : -2)),
        ),
      ),
    );
    expect(scatter.choices.discrepancy.strength).toBe(null);
    expect(scatter.choices.discrepancy.note).toMatch(/even the roughest/);
    expect(scatter.choices.corner.strength).not.toBe(null);
    expect(scatter.chosenBy).toBe('corner');
  });

  it('gives a profile also where everything is at zero', () => {
    const flat = freeRate();
    const nothing = solveFreeForm(
      prepareFreeForm(
        withValues(
          flat,
          flat.points.map(() => -1),
        ),
      ),
    );
    expect(nothing.status).toBe('solved');
    expect(Math.max(...nothing.unknowns)).toBe(0);
    expect(nothing.effectiveParameters).toBe(0);
    expect(nothing.choices.corner.strength).toBe(null);
  });
});

describe('a penalised problem whose columns are dependent', () => {
  const column = [1, 2, 3];
  const problem = {
    design: { rows: 3, columns: 2, values: Float64Array.from([...column, ...column]) },
    data: Float64Array.of(1, 1, 1),
    penalty: { rows: 1, columns: 2, values: Float64Array.of(0, 0) },
    target: Float64Array.of(0),
  };

  it('is said to be so without constraint, and has one of its solutions with it', () => {
    const loose = { ...problem, nonNegative: false };
    const work = createPenalisedWork(loose, 3);
    solveAtStrength(loose, work, 1);
    expect(work.status).toBe('dependent');
    expect(work.state.x[0]).toBe(NaN);
    expect(work.point.chiSquare).toBe(NaN);
    const constrained = { ...problem, nonNegative: true };
    const other = createPenalisedWork(constrained, 3);
    solveAtStrength(constrained, other, 1);
    expect(other.status).toBe('solved');
    expect(other.state.x[0]! + other.state.x[1]!).toBeCloseTo(6 / 14, 12);
    const curve = strengthCurve(loose, work, [3, 2, 1]);
    const { discrepancy, gcv, corner } = chooseStrength(loose, work, curve);
    expect([gcv.strength, corner.strength]).toEqual([null, null]);
    expect(discrepancy.strength).toBe(null);
  });
});
