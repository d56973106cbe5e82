import {
  createStoppingProfile,
  createStoppingSet,
  simulateScan,
  type FitInput,
  type StoppingSet,
} from '@/lib/inversion/index';

export const ENERGIES_KEV = [2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22];

/** Invented stopping profiles: Gaussians whose mean and spread grow with energy, in 1.5 nm bins. */
export function gaussianSet(energiesKeV = ENERGIES_KEV, bins = 160): StoppingSet {
  return createStoppingSet(
    energiesKeV.map((energyKeV) => {
      const [mean, spread] = [6 * energyKeV ** 0.95 + 3, 2.6 * energyKeV ** 0.82 + 1.5];
      const edges = Array.from({ length: bins + 1 }, (_, i) => i * 1.5);
      const weights = edges
        .slice(1)
        .map((edge) => Math.exp(-(((edge - 0.75 - mean) / spread) ** 2) / 2));
      return createStoppingProfile({
        energyKeV,
        positionsNm: edges,
        positionsAre: 'edges',
        weights,
        weightsAre: 'counts',
      });
    }),
  );
}

/** An invented scan over the Gaussian set: an edge at 78 nm, 9 nm wide, with seeded noise. */
export function workedInput(change: Partial<FitInput> = {}): FitInput {
  const template: FitInput = {
    observable: 'fraction',
    points: ENERGIES_KEV.map((energyKeV) => ({
      energyKeV,
      value: 0.5,
      sigma: 0.008,
      enabled: true,
    })),
    stopping: gaussianSet(),
    profile: 'graded',
    polarity: 'depletion',
    response: { kind: 'two-level' },
    carriers: { bulkPerCm3: 6.2e15, bulkSigmaPerCm3: 4e14, topPerCm3: null },
    capThicknessNm: 0,
    parameters: {},
  };
  const points = simulateScan({
    input: template,
    values: { edgeDepthNm: 78, edgeWidthNm: 9, levelTop: 0.74, levelBulk: 0.32, depthScale: 1 },
    sigmas: ENERGIES_KEV.map(() => 0.008),
    seed: 7,
  });
  return { ...template, points, ...change };
}
