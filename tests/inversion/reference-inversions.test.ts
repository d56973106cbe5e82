import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  createStoppingProfile,
  createStoppingSet,
  fit,
  prepareFit,
  type FitInput,
  type Observable,
  type ParameterName,
  type Polarity,
  type ProfileKind,
} from '@/lib/inversion/index';
import { answerOf, fractionInput, freeWith, heldAt } from './support/scans';

type Ends = [number | null, number | null];
type Named<T> = Partial<Record<ParameterName, T>>;

interface ReferenceCase {
  name: string;
  profile: ProfileKind;
  observable: Observable;
  polarity: Polarity;
  capThicknessNm: number;
  baselinePerUs: number;
  held: Named<number>;
  priors: Named<[number, number]>;
  values: number[];
  sigmas: number[];
  reference: {
    chiSquare: number;
    parameters: Named<number>;
    sigmas: Named<number> | null;
    intervals68: Named<Ends>;
    intervals95: Named<Ends>;
    iminuit: { chiSquare: number; valid: boolean; minos68: Named<Ends> } | null;
  };
}

interface Reference {
  energiesKeV: number[];
  edgesNm: number[];
  counts: number[][];
  cases: ReferenceCase[];
}

/**
 * Source: SciPy least_squares with many starts, a profile walked out with brentq, and iminuit's minos
 * (tests/reference/make_reference.py; versions in the file).
 */
const reference = JSON.parse(
  readFileSync('fixtures/reference/inversion/inversions.json', 'utf8'),
) as Reference;
const stopping = createStoppingSet(
  reference.energiesKeV.map((energyKeV, i) =>
    createStoppingProfile({
      energyKeV,
      positionsNm: reference.edgesNm,
      positionsAre: 'edges',
      weights: reference.counts[i]!,
      weightsAre: 'counts',
    }),
  ),
);

function inputOf(c: ReferenceCase): FitInput {
  return fractionInput({
    observable: c.observable,
    profile: c.profile,
    polarity: c.polarity,
    stopping,
    capThicknessNm: c.capThicknessNm,
    response:
      c.observable === 'fraction'
        ? { kind: 'two-level' }
        : {
            kind: 'capture-rate',
            gammaCm3PerS: 1e-6,
            gammaSigmaCm3PerS: null,
            baselinePerUs: c.baselinePerUs,
          },
    points: reference.energiesKeV.map((energyKeV, i) => ({
      energyKeV,
      value: c.values[i]!,
      sigma: c.sigmas[i]!,
      enabled: true,
    })),
    parameters: {
      ...Object.fromEntries(Object.entries(c.held).map(([name, value]) => [name, heldAt(value)])),
      ...Object.fromEntries(
        Object.entries(c.priors).map(([name, [mean, sigma]]) => [name, freeWith(mean, sigma)]),
      ),
    },
  });
}

/** One per cent of the interval where it is closed; where one side is open, of the distance to the closed end. */
function expectEnds(
  mine: readonly [number | null, number | null],
  theirs: Ends,
  value: number,
  what: string,
): void {
  const width = (theirs[1] ?? value) - (theirs[0] ?? value);
  for (const side of [0, 1] as const) {
    const end = theirs[side];
    if (end === null) expect(mine[side], `${what}, end ${side}`).toBeNull();
    else {
      expect(mine[side], `${what}, end ${side}`).not.toBeNull();
      expect(
        Math.abs(mine[side]! - end) / width,
        `${what}, end ${side}: ${mine[side]!} against ${end}`,
      ).toBeLessThan(0.01);
    }
  }
}

describe('whole inversions against general-purpose libraries', () => {
  it('has at least eight cases of either profile and observable', () => {
    expect(reference.cases.length).toBeGreaterThanOrEqual(8);
    expect(new Set(reference.cases.map((c) => `${c.profile} ${c.observable}`)).size).toBe(4);
  });

  describe.each(reference.cases.map((c) => [c.name, c] as const))('%s', (_, c) => {
    const answer = answerOf(fit(prepareFit(inputOf(c))));
    const found = (name: ParameterName) =>
      answer.parameters.find((parameter) => parameter.name === name)!;
    const names = Object.keys(c.reference.intervals68) as ParameterName[];

    // Tolerance 1e-6 relative: what SciPy's own stop leaves.
    it('reaches the same minimum', () => {
      expect(answer.status).toBe('converged');
      expect(
        Math.abs(answer.chiSquare - c.reference.chiSquare) / c.reference.chiSquare,
      ).toBeLessThan(1e-6);
    });

    // A thousandth of σ: far below anything that is shown. A width at its bound is compared by its interval alone.
    it('has the same values and linear errors', () => {
      for (const [name, sigma] of Object.entries(c.reference.sigmas ?? {}) as [
        ParameterName,
        number,
      ][]) {
        const close = Math.abs(found(name).value - c.reference.parameters[name]!) / sigma;
        expect(
          close,
          `${name}: ${found(name).value} against ${c.reference.parameters[name]!}`,
        ).toBeLessThan(1e-3);
        expect(found(name).sigma! / sigma, `σ of ${name}`).toBeCloseTo(1, 2);
      }
    });

    it('has the same profile-likelihood intervals within one per cent', () => {
      expect(names.length).toBeGreaterThanOrEqual(2);
      for (const name of names) {
        expectEnds(
          found(name).interval68,
          c.reference.intervals68[name]!,
          found(name).value,
          `68 % of ${name}`,
        );
        expectEnds(
          found(name).interval95,
          c.reference.intervals95[name]!,
          found(name).value,
          `95 % of ${name}`,
        );
      }
    });

    // Minos is compared where it found the same minimum, calls itself valid and closes both ends away from a limit.
    const { iminuit } = c.reference;
    const closed = iminuit?.valid && Math.abs(iminuit.chiSquare - c.reference.chiSquare) < 1e-4;
    if (closed) {
      it('agrees with minos', () => {
        for (const [name, ends] of Object.entries(iminuit!.minos68) as [ParameterName, Ends][]) {
          if (ends[0] === null || ends[1] === null || ends[0] <= 0) continue;
          expectEnds(found(name).interval68, ends, found(name).value, `minos of ${name}`);
        }
      });
    }
  });
});
