import { describe, expect, it } from 'vitest';

import { fitInputOf } from '@/components/review/fit-input-of';
import { savedFitFigures } from '@/components/review/saved-fit-figures';
import { weighFits } from '@/components/compare/weigh-fits';
import { carrierProfile, fit as fitNow, prepareFit, type FitAnswer } from '@/lib/inversion/index';
import type { Fit } from '@/lib/schemas/fit';
import type { StoppingSetAnswer } from '@/lib/schemas/stopping-set';

import { makeFit } from './make-fit';

const ENERGIES = [2, 4, 6, 8, 10, 12, 14, 16, 18];

/** Invented stopping profiles: a mean of 6 nm per keV and a third of that as straggling. */
const stoppingSet: StoppingSetAnswer = {
  id: '00000000-0000-4000-8000-000000900003',
  name: 'Invented',
  layerStack: 'Ge',
  origin: '',
  notes: '',
  energiesKeV: ENERGIES,
  bins: 125,
  sha256: 'b'.repeat(64),
  invented: true,
  archivedAt: null,
  createdAt: '2026-03-01T09:00:00.000Z',
  createdBy: 'Ana Lyst',
  warnings: [],
  files: [],
  profiles: ENERGIES.map((energyKeV) => {
    const [mean, spread] = [6 * energyKeV, 2 * energyKeV];
    const edgesNm = Array.from({ length: 126 }, (_, i) => 2 * i);
    const weights = edgesNm
      .slice(0, -1)
      .map((left) => Math.exp(-0.5 * ((left + 1 - mean) / spread) ** 2));
    const sum = weights.reduce((a, b) => a + b, 0);
    return { energyKeV, edgesNm, mass: weights.map((weight) => weight / sum), lostShare: null };
  }),
};

/** Values that rise in a smooth step with a known ripple: something that both edges can fit. */
const points = ENERGIES.map((energyKeV, index) => ({
  energyKeV,
  value: 0.3 + 0.4 / (1 + Math.exp(-(energyKeV - 9) / 2)) + 0.004 * (index % 3),
  sigma: 0.01,
  enabled: true,
}));

function fitted(kind: 'sharp' | 'graded', changes: Partial<Fit['spec']> = {}): Fit {
  const draft = makeFit({ points, spec: { profile: kind, resamples: 0, ...changes } });
  const prepared = prepareFit(fitInputOf(draft, stoppingSet));
  const outcome = fitNow(prepared);
  if (outcome.status === 'no-minimum') throw new Error(outcome.reason);
  const answer: FitAnswer = outcome.answer;
  return makeFit({
    points,
    spec: { profile: kind, resamples: 0, ...changes },
    answer: structuredClone(answer) as Fit['answer'],
    carrierProfile: structuredClone(carrierProfile(prepared, answer)) as Fit['carrierProfile'],
  });
}

describe('figures of a saved fit', () => {
  const fit = fitted('graded');
  const figures = savedFitFigures(fit, stoppingSet);

  it('folds a curve that runs through the predictions that were saved', () => {
    const { energiesKeV, values } = figures.curve;
    expect([energiesKeV[0], energiesKeV.at(-1)]).toEqual([2, 18]);
    // The ends of the curve are scan energies: the same fold, so equal to rounding.
    expect(values[0]).toBeCloseTo(fit.answer.residuals[0]!.predicted, 12);
    expect(values.at(-1)).toBeCloseTo(fit.answer.residuals.at(-1)!.predicted, 12);
  });

  it('draws one ridge per point in use, and information from 0 to 1', () => {
    expect(figures.ridges.map((ridge) => ridge.energyKeV)).toEqual(ENERGIES);
    const information = Array.from(figures.information.values);
    expect(Math.max(...information)).toBe(1);
    expect(Math.min(...information)).toBeGreaterThanOrEqual(0);
  });

  it('leaves a point that is switched off out of the ridges', () => {
    const fewer = fitted('graded', { switchedOffKeV: [10] });
    const { ridges } = savedFitFigures(fewer, stoppingSet);
    expect(ridges.map((ridge) => ridge.energyKeV)).not.toContain(10);
  });
});

describe('weighing a sharp against a graded fit', () => {
  it('tests zero width, and gives weights that add up to one', () => {
    const fits = [fitted('sharp'), fitted('graded')];
    const { judged, rows, tests, sentences } = weighFits(fits);
    expect(judged.comparable).toBe(true);
    expect(tests).toHaveLength(1);
    expect(tests[0]?.statistic).toBeCloseTo(
      fits[0]!.answer.chiSquare - fits[1]!.answer.chiSquare,
      9,
    );
    expect(rows.reduce((sum, row) => sum + (row.weight ?? 0), 0)).toBeCloseTo(1, 12);
    expect(sentences.length).toBeGreaterThan(0);
  });

  it('weighs nothing when one fit used fewer points', () => {
    const { judged, rows, tests } = weighFits([
      fitted('sharp'),
      fitted('graded', { switchedOffKeV: [10] }),
    ]);
    expect(judged.comparable).toBe(false);
    expect(tests).toEqual([]);
    expect(rows.map((row) => row.weight)).toEqual([null, null]);
  });
});
