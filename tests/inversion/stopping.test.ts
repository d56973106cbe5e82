import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  createStoppingProfile,
  createStoppingSet,
  cumulativeStopping,
  InversionError,
  MAX_BINS,
  stoppingMoments,
  stoppingProfileAt,
  stoppingQuantile,
  type StoppingProfileTable,
} from '@/lib/inversion/index';
import { SHARED_SET } from './support/scans';

const table = (change: Partial<StoppingProfileTable> = {}): StoppingProfileTable => ({
  energyKeV: 5,
  positionsNm: [0, 4, 12],
  positionsAre: 'edges',
  weights: [30, 10],
  weightsAre: 'counts',
  ...change,
});

function codeOf(act: () => unknown): string {
  try {
    act();
  } catch (error) {
    if (error instanceof InversionError) return error.code;
    throw error;
  }
  return 'nothing thrown';
}

describe('a stopping profile', () => {
  it('holds one muon in all', () => {
    expect([...createStoppingProfile(table()).mass]).toEqual([0.75, 0.25]);
  });

  it('takes a density per nm as density times width', () => {
    expect([
      ...createStoppingProfile(table({ weights: [3, 0.5], weightsAre: 'density' })).mass,
    ]).toEqual([0.75, 0.25]);
  });

  it('puts edges half way between centres, the first half a bin before or at the surface', () => {
    const edges = (positionsNm: number[]): number[] => [
      ...createStoppingProfile(
        table({ positionsNm, positionsAre: 'centres', weights: positionsNm.map(() => 1) }),
      ).edgesNm,
    ];
    expect(edges([0.5, 1.5, 2.5])).toEqual([0, 1, 2, 3]);
    expect(edges([10, 12, 16])).toEqual([9, 11, 14, 18]);
    expect(edges([0, 2, 4])).toEqual([0, 1, 3, 5]);
  });

  // Source: a uniform density on [0, 12] has mean 6, variance 144/12 and quantile 12u.
  it('has the moments and quantiles of a uniform density', () => {
    const uniform = createStoppingProfile(
      table({ positionsNm: [0, 1, 5, 12], weights: [1, 4, 7] }),
    );
    const { meanNm, straggleNm, medianNm, quantile05Nm, quantile95Nm } = stoppingMoments(uniform);
    expect(meanNm).toBeCloseTo(6, 12);
    expect(straggleNm).toBeCloseTo(Math.sqrt(12), 12);
    expect([medianNm, quantile05Nm, quantile95Nm].map((x) => Number(x.toFixed(10)))).toEqual([
      6, 0.6, 11.4,
    ]);
  });

  it('inverts its cumulative fraction', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        fc.integer({ min: 0, max: 12 }),
        (u, which) => {
          const profile = SHARED_SET.profiles[which]!;
          expect(cumulativeStopping(profile, stoppingQuantile(profile, u))).toBeCloseTo(u, 10);
        },
      ),
      { numRuns: 100, seed: 7 },
    );
  });

  it.each([
    ['bad-energy', { energyKeV: 0 }],
    ['bad-energy', { energyKeV: NaN }],
    ['too-few-bins', { positionsNm: [], weights: [] }],
    ['bad-depth', { positionsNm: [0, NaN, 12] }],
    ['bad-depth', { positionsNm: [-1, 4, 12] }],
    ['depths-out-of-order', { positionsNm: [0, 12, 4] }],
    ['depths-out-of-order', { positionsNm: [0, 4, 4] }],
    ['bin-count', { weights: [1, 2, 3] }],
    ['bad-weight', { weights: [1, -2] }],
    ['bad-weight', { weights: [1, NaN] }],
    ['empty-stopping-profile', { weights: [0, 0] }],
    ['bad-lost-share', { lostShare: 1 }],
    [
      'too-many-bins',
      {
        positionsNm: Array.from({ length: MAX_BINS + 2 }, (_, j) => j),
        weights: new Array<number>(MAX_BINS + 1).fill(1),
      },
    ],
  ] as const)('is refused as %s', (code, change) => {
    expect(codeOf(() => createStoppingProfile(table(change)))).toBe(code);
  });
});

describe('a stopping set', () => {
  it('is sorted by energy and refuses an energy twice', () => {
    const at = (energyKeV: number) => createStoppingProfile(table({ energyKeV }));
    expect(
      createStoppingSet([at(8), at(2), at(5)]).profiles.map((profile) => profile.energyKeV),
    ).toEqual([2, 5, 8]);
    expect(codeOf(() => createStoppingSet([at(5), at(5 * (1 + 1e-12))]))).toBe('duplicate-energy');
    expect(codeOf(() => createStoppingSet([]))).toBe('empty-stopping-set');
    expect(codeOf(() => createStoppingSet(Array.from({ length: 201 }, (_, k) => at(k + 1))))).toBe(
      'too-many-energies',
    );
  });

  it('gives a profile of its own unmarked and never extrapolates', () => {
    expect(stoppingProfileAt(SHARED_SET, 10)).toBe(SHARED_SET.profiles[6]);
    expect(codeOf(() => stoppingProfileAt(SHARED_SET, 1.9))).toBe('energy-outside-stopping-set');
    expect(codeOf(() => stoppingProfileAt(SHARED_SET, 22.1))).toBe('energy-outside-stopping-set');
  });

  // Source: for profiles that differ by place and scale only, averaging quantiles averages place and scale (exactly).
  it('interpolates by quantiles in ln E', () => {
    const weights = [0.1, 0.5, 0, 0.3, 0.1];
    const low = createStoppingProfile(
      table({ energyKeV: 4, positionsNm: [0, 10, 20, 25, 40, 60], weights, lostShare: 0.01 }),
    );
    const high = createStoppingProfile(
      table({ energyKeV: 9, positionsNm: [30, 45, 60, 67.5, 90, 120], weights, lostShare: 0.03 }),
    );
    const middle = stoppingProfileAt(createStoppingSet([low, high]), 6);
    expect(middle.interpolatedBetween).toEqual([4, 9]);
    expect(middle.lostShare).toBeCloseTo(0.02, 12);
    // ln 6 lies half way between ln 4 and ln 9.
    expect([...middle.edgesNm].map((x) => Number(x.toFixed(9)))).toEqual([
      15, 27.5, 40, 46.25, 65, 90,
    ]);
    expect([...middle.mass].map((x) => Number(x.toFixed(9)))).toEqual(weights);
  });

  it('interpolates every quantile between unlike profiles, empty ends and gaps included', () => {
    const low = createStoppingProfile(
      table({ energyKeV: 4, positionsNm: [0, 5, 10, 20, 25, 40], weights: [0, 2, 0, 5, 3] }),
    );
    const high = createStoppingProfile(
      table({ energyKeV: 9, positionsNm: [0, 30, 45, 60], weights: [1, 6, 3] }),
    );
    const middle = stoppingProfileAt(createStoppingSet([low, high]), 5);
    const t = Math.log(5 / 4) / Math.log(9 / 4);
    expect(middle.mass.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 12);
    for (const u of [0.01, 0.1, 0.19, 0.21, 0.5, 0.7, 0.9, 0.99]) {
      const expected = (1 - t) * stoppingQuantile(low, u) + t * stoppingQuantile(high, u);
      expect(stoppingQuantile(middle, u), `u = ${u}`).toBeCloseTo(expected, 9);
    }
    for (let j = 1; j < middle.edgesNm.length; j++)
      expect(middle.edgesNm[j]!).toBeGreaterThan(middle.edgesNm[j - 1]!);
  });
});
