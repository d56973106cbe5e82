import { describe, expect, it } from 'vitest';
import {
  carrierProfile,
  createStoppingSet,
  fit,
  prepareFit,
  runChecks,
  simulateScan,
  type Check,
  type FitInput,
  type ParameterValues,
} from '@/lib/inversion/index';
import { runsTest } from '@/lib/inversion/statistics/runs-test';
import {
  answerOf,
  fractionInput,
  free,
  freeWith,
  rateInput,
  SHARED_SET,
  stoppingSet,
} from './support/scans';

const truth = { edgeDepthNm: 75, edgeWidthNm: 16, levelTop: 0.74, levelBulk: 0.32 };

function checksOf(
  template: FitInput,
  values: ParameterValues = truth,
  seed = 1,
  spoil: (input: FitInput) => FitInput = (input) => input,
): Map<string, Check> {
  const input = spoil({ ...template, points: simulateScan({ input: template, values, seed }) });
  const prepared = prepareFit(input);
  const answer = answerOf(fit(prepared));
  return new Map(
    runChecks(prepared, answer, carrierProfile(prepared, answer)).map((check) => [check.id, check]),
  );
}

describe('the checks of a sound fit', () => {
  const checks = checksOf(fractionInput({}, 0.004));

  it('are fine, in sentences with a figure', () => {
    expect([...checks.values()].filter(({ state }) => state !== 'fine')).toEqual([]);
    expect(checks.size).toBeGreaterThanOrEqual(11);
    for (const { id, message } of checks.values()) {
      expect(id).toMatch(/^[a-z]+(-[a-z]+)*$/);
      expect(message).toMatch(/^[A-Zχ0-9].*\.$/);
      expect(message).not.toMatch(/NaN|undefined|null|Infinity/);
    }
    const withFigure = [...checks.values()].filter(({ message }) => /\d/.test(message));
    expect(withFigure.length).toBeGreaterThanOrEqual(checks.size - 3);
  });
});

describe('each check speaks up', () => {
  const spoiled =
    (index: number, by: number) =>
    (input: FitInput): FitInput => ({
      ...input,
      points: input.points.map((p, i) => (i === index ? { ...p, value: p.value + by } : p)),
    });

  it.each<[string, Check['state'], () => Map<string, Check>]>([
    [
      'points-vs-parameters',
      'problem',
      () =>
        checksOf(
          fractionInput({
            points: fractionInput({}, 0.004).points.filter((_, i) => [1, 6, 8, 12].includes(i)),
          }),
        ),
    ],
    [
      'points-vs-parameters',
      'caution',
      () =>
        checksOf(
          fractionInput({
            points: fractionInput({}, 0.004).points.filter((_, i) =>
              [1, 4, 6, 8, 10, 12].includes(i),
            ),
          }),
        ),
    ],
    ['chi-square', 'problem', () => checksOf(fractionInput({}, 0.004), truth, 1, spoiled(7, 0.05))],
    [
      'chi-square',
      'caution',
      () =>
        checksOf(fractionInput({}, 0.002), truth, 1, (input) => ({
          ...input,
          points: input.points.map((p) => ({ ...p, sigma: 0.02 })),
        })),
    ],
    // An edge far wider than a step bends the residuals of neighbours the same way.
    [
      'residual-runs',
      'caution',
      () => checksOf(fractionInput({ profile: 'sharp' }, 0.003), { ...truth, edgeWidthNm: 45 }, 4),
    ],
    [
      'parameter-at-bound',
      'caution',
      () => checksOf(fractionInput({}, 0.02), { ...truth, levelTop: 1, levelBulk: 0 }, 3),
    ],
    [
      'correlation',
      'caution',
      () => checksOf(fractionInput({}, 0.004), { ...truth, edgeDepthNm: 125, edgeWidthNm: 35 }, 3),
    ],
    [
      'edge-reach',
      'problem',
      () =>
        checksOf(
          fractionInput(
            { profile: 'sharp', parameters: { levelBulk: freeWith(0.3, 0.02) } },
            0.004,
          ),
          { ...truth, edgeDepthNm: 212 },
          3,
        ),
    ],
    [
      'edge-reach',
      'caution',
      () =>
        checksOf(
          fractionInput({ profile: 'sharp', parameters: { levelBulk: freeWith(0.3, 0.05) } }, 0.04),
          { ...truth, edgeDepthNm: 165 },
          1,
        ),
    ],
    [
      'stopping-interpolated',
      'caution',
      () =>
        checksOf(
          fractionInput(
            { stopping: createStoppingSet(SHARED_SET.profiles.filter((_, i) => i !== 5)) },
            0.004,
          ),
        ),
    ],
    [
      'stopping-loss',
      'caution',
      () =>
        checksOf(
          fractionInput(
            {
              stopping: createStoppingSet(
                SHARED_SET.profiles.map((p, i) => (i === 12 ? { ...p, lostShare: 0.06 } : p)),
              ),
            },
            0.004,
          ),
        ),
    ],
    [
      'stopping-loss',
      'caution',
      () => checksOf(fractionInput({ stopping: stoppingSet(undefined, 130, 1) }, 0.004)),
    ],
    [
      'bin-width',
      'caution',
      () =>
        checksOf(fractionInput({ stopping: stoppingSet(undefined, 32, 10) }, 0.003), {
          ...truth,
          edgeWidthNm: 20,
        }),
    ],
    [
      'depth-scale',
      'caution',
      () => checksOf(fractionInput({ parameters: { depthScale: free } }, 0.002)),
    ],
    [
      'leave-one-out',
      'problem',
      () => checksOf(fractionInput({}, 0.004), truth, 1, spoiled(12, 0.06)),
    ],
    [
      'contrast',
      'problem',
      () => checksOf(fractionInput({}, 0.02), { ...truth, levelTop: 0.5, levelBulk: 0.45 }, 8),
    ],
    ['polarity', 'problem', () => checksOf(rateInput(), { ...truth, levelTop: 3, levelBulk: 0.1 })],
    [
      'capture-coefficient',
      'caution',
      () => checksOf(rateInput(), { ...truth, levelTop: 0.1, levelBulk: 3 }),
    ],
  ])('%s: %s', (id, state, checks) => {
    expect(checks().get(id)).toMatchObject({ id, state });
  });

  it('names the energies that know the edge', () => {
    const message = checksOf(fractionInput({}, 0.004)).get('edge-reach')!.message;
    expect(message).toMatch(
      /^Edge is inside reach\. \d+ % of the information on it comes from \d+ to \d+ keV\.$/,
    );
  });

  it('the bias of a depth-scale prior is a share of the variance', () => {
    const sharp = checksOf(
      fractionInput({ parameters: { depthScale: freeWith(1, 0.001) } }, 0.004),
    ).get('depth-scale')!;
    expect(sharp.state).toBe('fine');
  });

  it('closure notices intervals that are too small for the scatter', () => {
    const template = fractionInput({}, 0.004);
    const prepared = prepareFit({
      ...template,
      points: simulateScan({ input: template, values: truth, seed: 1 }),
    });
    const answer = answerOf(fit(prepared));
    const profile = carrierProfile(prepared, answer);
    const shrunk = {
      ...answer,
      parameters: answer.parameters.map((p) =>
        p.name === 'edgeDepthNm'
          ? { ...p, interval68: [p.value - 0.3, p.value + 0.3] as const }
          : p,
      ),
    };
    const state = (of: typeof answer) =>
      runChecks(prepared, of, profile).find(({ id }) => id === 'closure')!.state;
    expect(state(answer)).toBe('fine');
    expect(state(shrunk)).toBe('caution');
  });
});

describe('the runs test', () => {
  const signs = (text: string): boolean[] => [...text].map((sign) => sign === '+');

  // Source: F. S. Swed and C. Eisenhart, Ann. Math. Stat. 14, 66 (1943), the tables of P(runs ≤ r); small cases counted by hand:
  // of the C(6, 3) = 20 orders of three + and three − two have 2 runs, two more pairs have 3 (4 orders), so P(≤ 3) = 6/20.
  it.each([
    ['+++---', 2, 2 / 20],
    ['++-+--', 4, 14 / 20],
    ['++--+-', 4, 14 / 20],
    ['+--++-', 4, 14 / 20],
    ['++---+', 3, 6 / 20],
    ['+-+-+-', 6, 1],
  ])('counts the orders of %s exactly', (text, runs, pValue) => {
    const test = runsTest(signs(text))!;
    expect(test.runs).toBe(runs);
    expect(test.pValue).toBeCloseTo(pValue, 12);
    expect(test.expected).toBe(4);
  });

  it('says nothing of fewer than five, and takes one sign only as coins', () => {
    expect(runsTest(signs('++-'))).toBeNull();
    expect(runsTest(signs('++++++'))!.pValue).toBe(1 / 32);
  });
});
