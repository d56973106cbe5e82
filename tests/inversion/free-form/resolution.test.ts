import { describe, expect, it } from 'vitest';
import {
  createPenalisedWork,
  freeFormAt,
  prepareFreeForm,
  resolutionMatrix,
  solveAtStrength,
  type ColumnMatrix,
  type FreeFormInput,
  type PreparedFreeForm,
} from '@/lib/inversion/index';
import { uniforms } from '../support/scans';
import { largestDifference } from './support/compare';
import { freeRate, withValues } from './support/inputs';

function times({ rows, columns, values }: ColumnMatrix, u: ArrayLike<number>): Float64Array {
  const out = new Float64Array(rows);
  for (let j = 0; j < columns; j++)
    for (let i = 0; i < rows; i++) out[i] = out[i]! + values[j * rows + i]! * u[j]!;
  return out;
}

function unconstrained(
  { design, penalty, dataCount }: PreparedFreeForm,
  data: Float64Array,
  strength: number,
) {
  const problem = {
    design,
    data,
    penalty,
    target: new Float64Array(penalty.rows),
    nonNegative: false,
  };
  const work = createPenalisedWork(problem, dataCount);
  solveAtStrength(problem, work, strength);
  return work;
}

const dot = (row: readonly number[], u: ArrayLike<number>): number =>
  row.reduce((sum, value, k) => sum + value * u[k]!, 0);

const CASES = [
  { difference: 1, strength: 400 },
  { difference: 2, strength: 3e5 },
] as const;

describe('the resolution matrix', () => {
  // Source: its definition (Backus and Gilbert 1968): what is found from noise-free data of any truth is R times that truth.
  it.each(CASES)(
    'is what the solution makes of noise-free data: difference $difference',
    ({ difference, strength }) => {
      const prepared = prepareFreeForm(freeRate({ difference }));
      const resolution = resolutionMatrix(prepared.design, prepared.penalty, strength)!;
      const { between } = uniforms(7);
      for (let k = 0; k < 5; k++) {
        const truth = Array.from(prepared.knotsNm, () => between(0, 2));
        const work = unconstrained(prepared, times(prepared.design, truth), strength);
        const expected = resolution.kernels.map((row) => dot(row, truth));
        expect(largestDifference(work.state.x, expected)).toBeLessThan(1e-9);
        // Its trace is that of the influence of the data on themselves.
        expect(work.point.effectiveParameters).toBeCloseTo(resolution.effectiveParameters, 8);
      }
    },
  );

  // Source: L of a constant is 0, so a constant is found exactly; with second differences a straight line too.
  it.each(CASES)(
    'gives back what the penalty does not see: difference $difference',
    ({ difference, strength }) => {
      const prepared = prepareFreeForm(freeRate({ difference }));
      const { kernels } = resolutionMatrix(prepared.design, prepared.penalty, strength)!;
      kernels.forEach((row, j) => {
        expect(row.reduce((sum, value) => sum + value, 0)).toBeCloseTo(1, 8);
        if (difference === 2)
          expect(dot(row, prepared.knotsNm) - prepared.knotsNm[j]!).toBeCloseTo(0, 6);
      });
    },
  );

  it('decides fewer numbers the stronger the penalty, down to what it does not see', () => {
    for (const difference of [1, 2] as const) {
      const { design, penalty } = prepareFreeForm(freeRate({ difference }));
      const traces = [-2, 0, 2, 4, 6, 8, 10, 12].map(
        (power) => resolutionMatrix(design, penalty, 10 ** power)!.effectiveParameters,
      );
      traces.forEach((trace, k) => {
        if (k > 0) expect(trace).toBeLessThan(traces[k - 1]!);
      });
      expect(traces[7]).toBeCloseTo(difference, 2);
    }
  });

  // A small change of the truth moves the constrained solution as its own resolution says, as long as the same values are at
  // zero.
  it.each([
    { monotonic: 'no', difference: 1 },
    { monotonic: 'rising', difference: 1 },
    { monotonic: 'falling', difference: 2 },
  ] as const)(
    'of a profile that is $monotonic monotonic is its derivative',
    ({ monotonic, difference }) => {
      const template = freeRate({ monotonic, difference, capThicknessNm: 5 });
      const prepared = prepareFreeForm(template);
      const { plain, offset } = prepared.observation;
      const truth = [
        ...Array.from(prepared.knotsNm, (x) => {
          const edge = 1 / (1 + Math.exp((60 - x) / 8));
          return monotonic === 'falling' ? 1 - edge : edge;
        }),
        0.3,
      ];
      // Some noise, so that zeros are zero with a margin.
      const { between } = uniforms(11);
      const noise = Array.from(prepared.knotsNm, () => between(-0.02, 0.02));
      const at = (u: readonly number[]): FreeFormInput =>
        withValues(
          template,
          times(plain, u).map((value, i) => value + offset[i]! + noise[i]!),
        );
      const strength = difference === 1 ? 30 : 3e4;
      const base = freeFormAt(prepareFreeForm(at(truth)), strength);
      expect(base.constrainedResolution!.effectiveParameters).toBeCloseTo(
        base.effectiveParameters,
        8,
      );
      for (const k of [3, 15, 22, 30, 40]) {
        const moved = truth.map((value, j) => (j === k ? value + 1e-4 : value));
        const found = freeFormAt(prepareFreeForm(at(moved)), strength);
        const all = (s: typeof base): number[] => [...s.unknowns, s.levelCap!];
        const slope = all(found).map((value, j) => (value - all(base)[j]!) / 1e-4);
        const column = base.constrainedResolution!.kernels.map((row) => row[k]!);
        // The change itself is linear; what is left is rounding of u over the step.
        slope.forEach((value, j) => expect(value).toBeCloseTo(column[j]!, 6));
      }
    },
  );
});
