import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import {
  createStoppingProfile,
  createStoppingSet,
  type FitInput,
  type FitOutcome,
  type FitAnswer,
  type ParameterSetting,
  type StoppingProfile,
  type StoppingSet,
} from '@/lib/inversion/index';

/** Invented energies and stopping profiles of the usual size: a mean depth near 8 nm·(E/keV)^0.85 and straggling of 0.4 of it. */
export const ENERGIES_KEV = [2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22] as const;

export const meanDepthNm = (energyKeV: number): number => 8 * energyKeV ** 0.85;

export function uniformEdges(bins: number, widthNm: number, firstNm = 0): number[] {
  return Array.from({ length: bins + 1 }, (_, j) => firstNm + j * widthNm);
}

/** A Gaussian cut at the surface, sampled at bin middles. */
export function gaussianProfile(
  energyKeV: number,
  edgesNm: readonly number[],
  meanNm: number,
  sigmaNm: number,
): StoppingProfile {
  const weights = edgesNm
    .slice(1)
    .map(
      (right, b) =>
        Math.exp(-0.5 * (((right + edgesNm[b]!) / 2 - meanNm) / sigmaNm) ** 2) *
        (right - edgesNm[b]!),
    );
  return createStoppingProfile({
    energyKeV,
    positionsNm: edgesNm,
    positionsAre: 'edges',
    weights,
    weightsAre: 'counts',
  });
}

export function stoppingSet(
  energiesKeV: readonly number[] = ENERGIES_KEV,
  bins = 320,
  widthNm = 1,
): StoppingSet {
  const edges = uniformEdges(bins, widthNm);
  return createStoppingSet(
    energiesKeV.map((energy) =>
      gaussianProfile(energy, edges, meanDepthNm(energy), 0.4 * meanDepthNm(energy) + 2),
    ),
  );
}

export const SHARED_SET = stoppingSet();

export function fractionInput(change: Partial<FitInput> = {}, sigma = 0.008): FitInput {
  return {
    observable: 'fraction',
    points: ENERGIES_KEV.map((energyKeV) => ({ energyKeV, value: 0, sigma, enabled: true })),
    stopping: SHARED_SET,
    profile: 'graded',
    polarity: 'depletion',
    response: { kind: 'two-level' },
    carriers: { bulkPerCm3: null, bulkSigmaPerCm3: null, topPerCm3: null },
    capThicknessNm: 0,
    parameters: {},
    ...change,
  };
}

export function rateInput(change: Partial<FitInput> = {}, sigma = 0.05): FitInput {
  return fractionInput(
    {
      observable: 'rate',
      response: {
        kind: 'capture-rate',
        gammaCm3PerS: 1e-6,
        gammaSigmaCm3PerS: null,
        baselinePerUs: 0.01,
      },
      ...change,
    },
    sigma,
  );
}

export const heldAt = (value: number): ParameterSetting => ({ held: true, value, prior: null });
export const freeWith = (mean: number, sigma: number): ParameterSetting => ({
  held: false,
  value: null,
  prior: { mean, sigma },
});
export const free: ParameterSetting = { held: false, value: null, prior: null };

export function answerOf(outcome: FitOutcome): FitAnswer {
  if (outcome.status === 'no-minimum') throw new Error(outcome.reason);
  return outcome.answer;
}

/** Seeded uniform numbers for tests, apart from the stream that the library draws from. */
export function uniforms(seed: number): {
  next: () => number;
  between: (low: number, high: number) => number;
  pick: <T>(list: readonly T[]) => T;
} {
  const generator = xoroshiro128plus(seed);
  const next = (): number => uniformFloat64(generator);
  return {
    next,
    between: (low, high) => low + (high - low) * next(),
    pick: (list) => list[Math.floor(next() * list.length)]!,
  };
}
