import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { captureRateScan } from '@/lib/inversion/charge-cycle/capture-rate-scan';
import { fitTemperatureScans } from '@/lib/inversion/charge-cycle/joint-fit';
import type {
  JointFitAnswer,
  JointFitOptions,
} from '@/lib/inversion/charge-cycle/joint-fit-answer';
import type { JointFitInput } from '@/lib/inversion/charge-cycle/joint-fit-input';
import { jointProblem, whiten } from '@/lib/inversion/charge-cycle/joint-problem';
import { simulateTemperatureScans } from '@/lib/inversion/charge-cycle/simulate-temperature-scans';
import { InversionError } from '@/lib/inversion/errors';

interface Case {
  name: string;
  fieldMt: number;
  activation: 'shared' | 'per energy';
  method: 'closed form' | 'exchange matrix';
  prior: { mean: number; sigma: number } | null;
  energiesKeV: number[];
  temperaturesK: number[];
  sigma: number;
  rates: number[][];
  theta: number[];
  chiSquare: number;
  covariance: number[][];
  minuit: {
    values: number[];
    chiSquare: number;
    minos68: Record<string, [number, number]>;
  } | null;
  upper95?: { index: number; value: number };
}

/** SciPy least_squares, iminuit with MINOS, SciPy brentq on the profile: tests/reference/charge-cycle.py. */
const { cases } = JSON.parse(
  readFileSync(
    new URL('../../../fixtures/reference/charge-cycle/joint-fits.json', import.meta.url),
    'utf8',
  ),
) as { cases: Case[] };

function inputOf({ activation, fieldMt, prior, ...series }: Case): JointFitInput {
  return {
    hyperfineMHz: 2359.5,
    fieldMt,
    activation,
    ...(prior && { activationPriorMeV: prior }),
    scans: series.energiesKeV.map((energyKeV, i) => ({
      energyKeV,
      points: series.temperaturesK.map((temperatureK, k) => ({
        temperatureK,
        ratePerUs: series.rates[i]![k]!,
        sigma: series.sigma,
        enabled: true,
      })),
    })),
  };
}

function answerOf(input: JointFitInput, options?: JointFitOptions): JointFitAnswer {
  const outcome = fitTemperatureScans(input, options);
  if (outcome.status === 'no-minimum') throw new Error(outcome.reason);
  return outcome.answer;
}

/** Names that the reference gives MINOS intervals under, in the order of θ. */
function referenceNames({ activation, energiesKeV }: Case): string[] {
  const activations =
    activation === 'shared' ? ['activation'] : energiesKeV.map((_, i) => `activation${i}`);
  return ['logAttempt', ...activations, ...energiesKeV.map((_, i) => `capture${i}`), 'baseline'];
}

describe.each(cases)('joint fit against SciPy and iminuit: $name', (reference) => {
  const answer = answerOf(inputOf(reference), { intervalsFor: 'all' });
  const sigmas = reference.covariance.map((row, k) => Math.sqrt(row[k]!));

  it('finds the same minimum with the method that the data need', () => {
    expect(answer.status).toBe('converged');
    expect(answer.method).toBe(reference.method);
    // least_squares stops at 1e-15 of the cost, with differences in its Jacobian.
    expect(Math.abs(answer.chiSquare - reference.chiSquare)).toBeLessThan(1e-6);
    if (reference.minuit) {
      expect(Math.abs(answer.chiSquare - reference.minuit.chiSquare)).toBeLessThan(1e-6);
    }
    answer.parameters.forEach(({ value }, k) => {
      // χ² within 1e-6 means values within 1e-3 of their σ.
      expect(Math.abs(value - reference.theta[k]!)).toBeLessThan(1e-3 * sigmas[k]!);
    });
    const points = reference.rates.flat().length;
    const priors = reference.prior ? reference.energiesKeV.length : 0;
    expect(answer.degreesOfFreedom).toBe(points + priors - answer.parameters.length);
  });

  it('gives the same covariance', () => {
    if (!answer.covariance.ok) throw new Error(answer.covariance.reason);
    const { indices, matrix } = answer.covariance;
    expect(indices).toEqual(reference.theta.map((_, k) => k));
    indices.forEach((k, a) =>
      indices.forEach((l, b) => {
        const scaled =
          Math.abs(matrix[a]![b]! - reference.covariance[k]![l]!) / (sigmas[k]! * sigmas[l]!);
        // The reference differentiates numerically: 1e-5 at the condition of ν against E_A (correlation 0.999).
        expect(scaled).toBeLessThan(2e-4);
      }),
    );
  });

  it('gives the same profile-likelihood intervals (MINOS)', () => {
    const names = referenceNames(reference);
    for (const [name, [lower, upper]] of Object.entries(reference.minuit?.minos68 ?? {})) {
      const k = names.indexOf(name);
      const { interval68 } = answer.parameters[k]!;
      // MINOS stops at a tolerance of 1e-2 σ or better.
      expect(Math.abs(interval68![0]! - lower), name).toBeLessThan(0.01 * sigmas[k]!);
      expect(Math.abs(interval68![1]! - upper), name).toBeLessThan(0.01 * sigmas[k]!);
    }
    if (reference.upper95) {
      const { index, value } = reference.upper95;
      const rate = answer.parameters[index]!;
      expect(rate.atBound).toBe('lower');
      expect(rate.interval95![0]).toBeNull();
      // Ours meets Δχ² to 1e-4 of it: 5e-5 of the distance.
      expect(Math.abs(rate.interval95![1]! / value - 1)).toBeLessThan(3e-4);
    }
  });
});

const TRUTH = {
  hyperfineMHz: 2359.5,
  fieldMt: 100,
  attemptPerUs: 3e6,
  baselinePerUs: 0.08,
  energies: [3, 8, 15].map((energyKeV, i) => ({
    energyKeV,
    capturePerUs: [0.4, 1.3, 2.2][i]!,
    activationMeV: 150,
  })),
  temperaturesK: [170, 185, 200, 215, 230, 245, 260, 275, 290],
  sigma: 0.03,
  seed: 1,
};
const SETTINGS = { hyperfineMHz: 2359.5, fieldMt: 100, activation: 'shared' } as const;

describe('simulate and recover', () => {
  it('pulls of all parameters over 120 seeds have mean 0 and σ 1, χ² its degrees of freedom', () => {
    const truth = [Math.log(3e6), 150, 0.4, 1.3, 2.2, 0.08];
    const runs = 120;
    const pulls = truth.map(() => ({ sum: 0, squares: 0 }));
    let chiSquare = 0;
    let degreesOfFreedom = 0;
    for (let seed = 1; seed <= runs; seed++) {
      const answer = answerOf({ ...SETTINGS, scans: simulateTemperatureScans({ ...TRUTH, seed }) });
      chiSquare += answer.chiSquare;
      degreesOfFreedom = answer.degreesOfFreedom;
      answer.parameters.forEach(({ value, sigma }, k) => {
        const pull = (value - truth[k]!) / sigma!;
        pulls[k]!.sum += pull;
        pulls[k]!.squares += pull * pull;
      });
    }
    for (const { sum, squares } of pulls) {
      // Three standard errors, and a tenth for the curvature of ν and E_A.
      expect(Math.abs(sum / runs)).toBeLessThan(3 / Math.sqrt(runs) + 0.1);
      expect(Math.abs(squares / runs - 1)).toBeLessThan(3 * Math.sqrt(2 / runs) + 0.1);
    }
    const spread = Math.sqrt((2 * degreesOfFreedom) / runs);
    expect(Math.abs(chiSquare / runs - degreesOfFreedom)).toBeLessThan(3 * spread);
  });

  it('never stops above what it finds from the truth itself, whatever the noise', () => {
    for (let seed = 200; seed < 214; seed++) {
      const scans = simulateTemperatureScans({ ...TRUTH, sigma: seed % 2 ? 0.3 : 0.01, seed });
      const input: JointFitInput = { ...SETTINGS, scans };
      const outcome = fitTemperatureScans(input);
      if (outcome.status === 'no-minimum') continue;
      const problem = jointProblem(input, outcome.answer.method);
      const atTruth = whiten(problem, Float64Array.from([Math.log(3e6), 150, 0.4, 1.3, 2.2, 0.08]));
      expect(outcome.answer.chiSquare).toBeLessThan(atTruth.chiSquare);
    }
  });

  it('recovers an activation energy per energy', () => {
    const energies = TRUTH.energies.map((energy, i) => ({
      ...energy,
      activationMeV: 140 + 10 * i,
    }));
    const scans = simulateTemperatureScans({ ...TRUTH, energies, sigma: 0.002 });
    const answer = answerOf({ ...SETTINGS, activation: 'per energy', scans });
    const found = answer.parameters.filter(({ name }) => name === 'activationMeV');
    expect(found.map(({ energyKeV }) => energyKeV)).toEqual([3, 8, 15]);
    found.forEach(({ value, sigma }, i) => {
      expect(Math.abs(value - (140 + 10 * i)) / sigma!).toBeLessThan(4);
      expect(sigma!).toBeLessThan(3);
    });
  });

  it('without noise gives the truth back', () => {
    const scans = simulateTemperatureScans({ ...TRUTH, sigma: 1e-9 });
    const { parameters } = answerOf({ ...SETTINGS, scans }, { method: 'exchange matrix' });
    [Math.log(3e6), 150, 0.4, 1.3, 2.2, 0.08].forEach((value, k) => {
      expect(Math.abs(parameters[k]!.value / value - 1)).toBeLessThan(1e-6);
    });
  });
});

describe('capture-rate scan of a joint fit', () => {
  const scans = simulateTemperatureScans(TRUTH);
  const answer = answerOf({ ...SETTINGS, scans: [...scans].reverse() });
  const outcome = captureRateScan(answer);
  if (!outcome.ok) throw new Error(outcome.reason);
  const { points, covariance } = outcome.scan;

  it('is in ascending energy with the rates and σ of the fit', () => {
    expect(points.map(({ energyKeV }) => energyKeV)).toEqual([3, 8, 15]);
    points.forEach(({ energyKeV, value, sigma }, k) => {
      const parameter = answer.parameters.find(
        (one) => one.name === 'capturePerUs' && one.energyKeV === energyKeV,
      )!;
      expect(value).toBe(parameter.value);
      expect(sigma).toBeCloseTo(parameter.sigma!, 12);
      expect(sigma ** 2).toBeCloseTo(covariance[k]![k]!, 12);
    });
  });

  it('has points that are correlated through the shared background, and a covariance that is one', () => {
    const correlation = covariance[0]![1]! / (points[0]!.sigma * points[1]!.sigma);
    expect(correlation).toBeGreaterThan(0.1);
    expect(correlation).toBeLessThan(1);
    expect(covariance[2]![0]).toBeCloseTo(covariance[0]![2]!, 14);
  });
});

describe('joint fit as a function of its input', () => {
  const scans = simulateTemperatureScans(TRUTH);
  const answer = answerOf({ ...SETTINGS, scans });

  it('does not depend on the order of energies and points', () => {
    const turned = [...scans]
      .reverse()
      .map((scan) => ({ ...scan, points: [...scan.points].reverse() }));
    const other = answerOf({ ...SETTINGS, scans: turned });
    expect(other.chiSquare).toBeCloseTo(answer.chiSquare, 8);
    for (const { name, energyKeV, value, sigma } of answer.parameters) {
      const same = other.parameters.find(
        (one) => one.name === name && one.energyKeV === energyKeV,
      )!;
      expect(Math.abs(same.value - value)).toBeLessThan(1e-4 * sigma!);
    }
  });

  it('leaves points that are switched off out, and says what it would expect of them', () => {
    const spoiled = scans.map((scan) => ({
      ...scan,
      points: [...scan.points, { temperatureK: 220, ratePerUs: 50, sigma: 0.01, enabled: false }],
    }));
    const other = answerOf({ ...SETTINGS, scans: spoiled });
    expect(other.chiSquare).toBeCloseTo(answer.chiSquare, 9);
    expect(other.residuals).toHaveLength(answer.residuals.length + 3);
    const off = other.residuals.filter(({ enabled }) => !enabled);
    expect(off).toHaveLength(3);
    off.forEach(({ predicted, reduced }) => {
      expect(predicted).toBeLessThan(3);
      expect(reduced).toBeCloseTo((50 - predicted) / 0.01, 6);
    });
  });

  it.each([
    ['logAttempt', { heldAttemptPerUs: 2e6 }, Math.log(2e6)],
    ['activationMeV', { heldActivationMeV: 160 }, 160],
    ['baselinePerUs', { heldBaselinePerUs: 0.05 }, 0.05],
  ] as const)('holding %s keeps it still and costs χ²', (name, setting, value) => {
    const held = answerOf({ ...SETTINGS, scans, ...setting });
    const parameter = held.parameters.find((one) => one.name === name)!;
    expect(parameter).toMatchObject({ held: true, value, sigma: null, atBound: null });
    expect(held.chiSquare).toBeGreaterThan(answer.chiSquare);
    expect(held.degreesOfFreedom).toBe(answer.degreesOfFreedom + 1);
  });

  it('with ν and E_A held is linear', () => {
    const held = answerOf({ ...SETTINGS, scans, heldAttemptPerUs: 3e6, heldActivationMeV: 150 });
    expect(held.status).toBe('converged');
    expect(held.chiSquare).toBeGreaterThan(answer.chiSquare);
    expect(held.chiSquare).toBeLessThan(answer.chiSquare + 20);
  });

  it('takes the exchange matrix where capture is fast, and the difference is seen', () => {
    const fast = simulateTemperatureScans({
      ...TRUTH,
      fieldMt: 10,
      sigma: 0.05,
      energies: TRUTH.energies.map((energy) => ({
        ...energy,
        capturePerUs: energy.capturePerUs * 50,
      })),
    });
    const input = { ...SETTINGS, fieldMt: 10, scans: fast };
    const exact = answerOf(input);
    expect(exact.method).toBe('exchange matrix');
    expect(exact.pValue!).toBeGreaterThan(1e-3);
    const closed = answerOf(input, { method: 'closed form' });
    expect(closed.method).toBe('closed form');
    expect(closed.chiSquare).toBeGreaterThan(exact.chiSquare + 100);
  });
});

describe('honest about what cannot be told', () => {
  it('no minimum where no rate falls with temperature', () => {
    const cold = simulateTemperatureScans({
      ...TRUTH,
      temperaturesK: [20, 30, 40, 50, 60],
      sigma: 0.03,
    });
    const outcome = fitTemperatureScans({ ...SETTINGS, scans: cold });
    expect(outcome.status).toBe('no-minimum');
    if (outcome.status === 'no-minimum') expect(outcome.reason).toMatch(/falls with temperature/);
  });

  it('a rate at zero is one-sided', () => {
    const energies = TRUTH.energies.map((energy, i) =>
      i === 0 ? { ...energy, capturePerUs: 0 } : energy,
    );
    const scans = simulateTemperatureScans({ ...TRUTH, energies });
    // Pushed below zero so that the bound is met whatever the seed.
    const lowered = scans.map((scan, i) =>
      i > 0
        ? scan
        : {
            ...scan,
            points: scan.points.map((point, k) => ({
              ...point,
              ratePerUs: point.ratePerUs - (k < 4 ? 0.05 : 0),
            })),
          },
    );
    const answer = answerOf({ ...SETTINGS, scans: lowered });
    const rate = answer.parameters.find(({ name }) => name === 'capturePerUs')!;
    expect(rate).toMatchObject({ energyKeV: 3, value: 0, atBound: 'lower' });
    expect(rate.interval95![0]).toBeNull();
    expect(rate.interval95![1]!).toBeGreaterThan(rate.interval68![1]!);
    expect(rate.sigma!).toBeGreaterThan(0);
    const scan = captureRateScan(answer);
    expect(scan.ok && scan.scan.points[0]!.sigma).toBe(rate.sigma);
  });
});

describe('joint fit refuses', () => {
  const scans = simulateTemperatureScans(TRUTH);
  const [first, ...others] = scans;
  const spoil = (change: object): JointFitInput => ({
    ...SETTINGS,
    scans: [
      { ...first!, points: [{ ...first!.points[0]!, ...change }, ...first!.points.slice(1)] },
      ...others,
    ],
  });
  it.each<[string, JointFitInput, RegExp]>([
    ['no scans', { ...SETTINGS, scans: [] }, /no temperature scans/],
    [
      'a scan without points',
      { ...SETTINGS, scans: [{ energyKeV: 3, points: [] }] },
      /no point that is switched on/,
    ],
    ['an energy twice', { ...SETTINGS, scans: [first!, first!] }, /holds 3 keV twice/],
    [
      'a rate that is not a number',
      spoil({ ratePerUs: NaN }),
      /Point 1 of the scan at 3 keV has the rate NaN/,
    ],
    ['σ of zero', spoil({ sigma: 0 }), /uncertainty 0/],
    ['a temperature below zero', spoil({ temperatureK: -5 }), /temperature -5 K/],
    ['no field', { ...SETTINGS, fieldMt: 0, scans }, /transverse field/],
    [
      'a hyperfine constant that is not a number',
      { ...SETTINGS, hyperfineMHz: NaN, scans },
      /hyperfine/,
    ],
    ['ν held where it cannot be', { ...SETTINGS, heldAttemptPerUs: 1, scans }, /must lie between/],
    [
      'E_A held and with a prior',
      { ...SETTINGS, heldActivationMeV: 150, activationPriorMeV: { mean: 150, sigma: 5 }, scans },
      /either held or has a prior/,
    ],
    ['a background below zero', { ...SETTINGS, heldBaselinePerUs: -1, scans }, /background/],
  ])('%s', (_, input, message) => {
    expect(() => fitTemperatureScans(input)).toThrow(InversionError);
    expect(() => fitTemperatureScans(input)).toThrow(message);
  });

  it('to simulate what cannot be', () => {
    expect(() => simulateTemperatureScans({ ...TRUTH, sigma: 0 })).toThrow(InversionError);
    expect(() => simulateTemperatureScans({ ...TRUTH, energies: [] })).toThrow(InversionError);
    expect(() => simulateTemperatureScans({ ...TRUTH, temperaturesK: [NaN] })).toThrow(
      InversionError,
    );
  });
});
