import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  InversionError,
  fit,
  foldScan,
  prepareFit,
  prepareFreeForm,
  resample,
  simulateScan,
  type FitInput,
} from '@/lib/inversion/index';
import { PROFILE_CASES } from './profiles/support';
import { rateInput } from './support/scans';

type Path = (string | number)[];

/** Where the numbers, lists and nulls of an input are. Of long lists the first and the last entry stand for all. */
function leavesOf(value: unknown, path: Path = []): Path[] {
  if (value instanceof Float64Array || typeof value !== 'object' || value === null) return [path];
  const keys = Array.isArray(value)
    ? [...new Set([0, value.length - 1])].filter((k) => k >= 0 && k < value.length)
    : Object.keys(value);
  const below = keys.flatMap((key) =>
    leavesOf((value as Record<string, unknown>)[key], [...path, key]),
  );
  return Array.isArray(value) ? [path, ...below] : below;
}

/** The input with one thing in it replaced; everything else is shared. */
function replaced(value: unknown, path: Path, by: unknown): unknown {
  const [key, ...rest] = path;
  if (key === undefined) return by;
  const copy = Array.isArray(value) ? [...value] : { ...(value as object) };
  (copy as Record<string, unknown>)[key] = replaced(
    (value as Record<string, unknown>)[key],
    rest,
    by,
  );
  return copy;
}

function at(value: unknown, path: Path): unknown {
  return path.reduce((inner, key) => (inner as Record<string, unknown>)[key], value);
}

/** What may stand where a number or a list should: things that a file, a form or a slip can bring. */
function spoilt(original: unknown): fc.Arbitrary<unknown> {
  if (Array.isArray(original)) return fc.constant([]);
  if (original instanceof Float64Array) {
    return fc.constantFrom(
      new Float64Array(0),
      original.slice(1),
      original.map((x, k) => (k === 3 ? NaN : x)),
      original.map((x, k) => (k === 3 ? -1 : x)),
    );
  }
  if (typeof original === 'number')
    return fc.constantFrom(NaN, Infinity, -Infinity, -1, 0, -0, 1e308, 5e-324);
  return fc.constantFrom(NaN, -1);
}

/** Runs what a spoilt input allows: it is refused by name, or everything that comes of it is finite. */
function refusedOrFinite(run: () => ArrayLike<number>): void {
  let numbers: ArrayLike<number>;
  try {
    numbers = run();
  } catch (error) {
    expect(error, String((error as Error).stack)).toBeInstanceOf(InversionError);
    expect((error as InversionError).code).toMatch(/^[a-z-]+$/);
    expect((error as InversionError).message).toMatch(/^[A-Z].*\.$/);
    return;
  }
  Array.from(numbers).forEach((value) => expect(Number.isFinite(value)).toBe(true));
}

const measured = PROFILE_CASES.filter(({ name }) => !/layer,.*saturating/.test(name)).map(
  ({ name, input, values }) => ({
    name,
    input: {
      ...input,
      points: simulateScan({ input, values, seed: 1 }),
      covariance: input.points.map(({ sigma: a }, i) =>
        input.points.map(({ sigma: b }, j) => a * b * (i === j ? 1 : 0.2)),
      ),
    } as FitInput,
  }),
);

describe('input that is wrong somewhere', () => {
  it.each(measured.map((one) => [one.name, one.input] as const))(
    'is refused by name, or fitted with finite numbers: %s',
    (_, input) => {
      const paths = leavesOf(input).filter(
        (path) => !['string', 'boolean'].includes(typeof at(input, path)),
      );
      const spoil = fc
        .constantFrom(...paths)
        .chain((path) => spoilt(at(input, path)).map((by) => ({ path, by })));
      fc.assert(
        fc.property(spoil, ({ path, by }) => {
          refusedOrFinite(() => {
            const prepared = prepareFit(replaced(input, path, by) as FitInput);
            const outcome = fit(prepared, { intervalsFor: [] });
            // A scan may say nothing; a number that is none may not get so far.
            if (outcome.status === 'no-minimum') {
              expect(outcome.reason).not.toMatch(/not finite/);
              return [];
            }
            const { answer } = outcome;
            const rows = resample(prepared, answer, { seed: 1, first: 0, count: 1 });
            return [answer.chiSquare, ...answer.parameters.map(({ value }) => value), ...rows];
          });
        }),
        { numRuns: 25, seed: 20260118 },
      );
    },
    30_000,
  );

  it('is refused by name by a fold', () => {
    for (const { input, values } of PROFILE_CASES) {
      const prepared = prepareFit({ ...input });
      for (const name of Object.keys(values)) {
        for (const value of [NaN, Infinity, -1e9]) {
          // A level may be any finite number in a fold; the depths, widths and the rest may not.
          if (name.startsWith('level') && Number.isFinite(value)) continue;
          expect(() => foldScan(prepared, { ...values, [name]: value }), name).toThrow(
            InversionError,
          );
        }
      }
    }
  });

  it('is refused by name by a free form', () => {
    const base = rateInput({}, 0.05);
    const input = {
      ...base,
      points: simulateScan({
        input: base,
        values: { edgeDepthNm: 70, edgeWidthNm: 10, levelTop: 0.1, levelBulk: 2 },
        seed: 1,
      }),
      difference: 2 as const,
      monotonic: 'no' as const,
      knotsNm: [0, 20, 50, 90, 140],
    };
    const paths = leavesOf(input).filter(
      (path) => !['string', 'boolean'].includes(typeof at(input, path)),
    );
    fc.assert(
      fc.property(
        fc
          .constantFrom(...paths)
          .chain((path) => spoilt(at(input, path)).map((by) => ({ path, by }))),
        ({ path, by }) => {
          refusedOrFinite(() => {
            prepareFreeForm(replaced(input, path, by) as typeof input);
            return [];
          });
        },
      ),
      { numRuns: 200, seed: 20260119 },
    );
  });
});
