import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  createStoppingProfile,
  createStoppingSet,
  fit,
  prepareFit,
  type CarrierScale,
  type FitInput,
  type Observable,
  type ParameterName,
  type Polarity,
  type ProfileKind,
  type Response,
  type SemiconductorBulk,
  type StoppingSet,
} from '@/lib/inversion/index';
import { answerOf, fractionInput, free, freeWith, heldAt } from './support/scans';

type Ends = [number | null, number | null];
type Named<T> = Partial<Record<ParameterName, T>>;

interface ReferenceCase {
  name: string;
  profile: ProfileKind;
  observable: Observable;
  polarity: Polarity;
  capThicknessNm: number;
  held: Named<number>;
  priors: Named<[number, number]>;
  values: number[];
  sigmas: number[];
  /** Λ₀ of a capture rate where no response is named. */
  baselinePerUs?: number;
  response?: Response;
  carriers?: CarrierScale;
  semiconductor?: SemiconductorBulk | null;
  covariance?: number[][] | null;
  reference: {
    chiSquare: number;
    parameters: Named<number>;
    sigmas: Named<number> | null;
    intervals68: Named<Ends>;
    intervals95: Named<Ends>;
    iminuit?: { chiSquare: number; valid: boolean; minos68: Named<Ends> } | null;
    lmfit?: { chiSquare: number; parameters: Named<number>; sigmas: Named<number | null> } | null;
  };
}

interface Reference {
  energiesKeV: number[];
  edgesNm: number[];
  counts: number[][];
  cases: ReferenceCase[];
}

function stoppingOf({ energiesKeV, edgesNm, counts }: Reference): StoppingSet {
  return createStoppingSet(
    energiesKeV.map((energyKeV, i) =>
      createStoppingProfile({
        energyKeV,
        positionsNm: edgesNm,
        positionsAre: 'edges',
        weights: counts[i]!,
        weightsAre: 'counts',
      }),
    ),
  );
}

function responseOf({ response, observable, baselinePerUs }: ReferenceCase): Response {
  if (response) return response;
  if (observable === 'fraction') return { kind: 'two-level' };
  return {
    kind: 'capture-rate',
    gammaCm3PerS: 1e-6,
    gammaSigmaCm3PerS: null,
    baselinePerUs: baselinePerUs!,
  };
}

function inputOf(c: ReferenceCase, { energiesKeV }: Reference, stopping: StoppingSet): FitInput {
  return fractionInput({
    observable: c.observable,
    profile: c.profile,
    polarity: c.polarity,
    stopping,
    capThicknessNm: c.capThicknessNm,
    response: responseOf(c),
    ...(c.carriers ? { carriers: c.carriers } : {}),
    semiconductor: c.semiconductor ?? null,
    covariance: c.covariance ?? null,
    points: energiesKeV.map((energyKeV, i) => ({
      energyKeV,
      value: c.values[i]!,
      sigma: c.sigmas[i]!,
      enabled: true,
    })),
    parameters: {
      ...Object.fromEntries(Object.keys(c.reference.parameters).map((name) => [name, free])),
      ...Object.fromEntries(Object.entries(c.held).map(([name, value]) => [name, heldAt(value)])),
      ...Object.fromEntries(
        Object.entries(c.priors).map(([name, [mean, sigma]]) => [name, freeWith(mean, sigma)]),
      ),
    },
  });
}

/**
 * Source: SciPy least_squares with many starts and a profile walked out with brentq, iminuit's minos, and lmfit
 * (tests/reference/make_reference.py and profile_inversions.py; versions in the files).
 */
const cases = ['inversions.json', 'profile-inversions.json'].flatMap((file) => {
  const reference = JSON.parse(
    readFileSync(`fixtures/reference/inversion/${file}`, 'utf8'),
  ) as Reference;
  const stopping = stoppingOf(reference);
  return reference.cases.map((c) => ({ ...c, input: inputOf(c, reference, stopping) }));
});

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
  it('has cases of every profile, response and kind of uncertainty', () => {
    expect(cases.length).toBeGreaterThanOrEqual(33);
    expect(new Set(cases.map(({ input }) => `${input.profile} ${input.response.kind}`))).toEqual(
      new Set([
        ...['sharp', 'graded', 'layer', 'band-bending'].flatMap((profile) => [
          `${profile} two-level`,
          `${profile} capture-rate`,
        ]),
        // A step shows the saturating fraction its two levels and nothing between.
        ...['graded', 'layer', 'band-bending'].map((profile) => `${profile} saturating-fraction`),
      ]),
    );
    const correlated = cases.filter(({ covariance }) => covariance);
    expect(new Set(correlated.map(({ profile }) => profile)).size).toBe(4);
    const open = cases.filter(({ reference }) =>
      Object.values(reference.intervals95).some((ends) => ends.includes(null)),
    );
    expect(new Set(open.map(({ profile }) => profile))).toEqual(
      new Set(['sharp', 'layer', 'band-bending']),
    );
  });

  describe.each(cases.map((c) => [c.name, c] as const))('%s', (_, c) => {
    const answer = answerOf(fit(prepareFit(c.input)));
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

    // lmfit is compared where it found the same minimum; its own stop leaves a thousandth of σ, its numerical Jacobian 1 % of it.
    const { lmfit } = c.reference;
    if (lmfit && Math.abs(lmfit.chiSquare - c.reference.chiSquare) < 1e-6) {
      it('agrees with lmfit', () => {
        for (const [name, sigma] of Object.entries(lmfit.sigmas) as [ParameterName, number][]) {
          if (found(name).sigma === null) continue;
          expect(
            Math.abs(found(name).value - lmfit.parameters[name]!) / found(name).sigma!,
            name,
          ).toBeLessThan(5e-3);
          expect(Math.abs(found(name).sigma! / sigma - 1), `σ of ${name}`).toBeLessThan(0.02);
        }
      });
    }
  });
});
