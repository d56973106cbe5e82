import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  carrierProfile,
  createStoppingSet,
  depthInformation,
  edgeInformationByEnergy,
  fit,
  foldScan,
  InversionError,
  prepareFit,
  simulateScan,
  stoppingQuantile,
  valuesOf,
  type FitInput,
  type ParameterName,
} from '@/lib/inversion/index';
import {
  answerOf,
  fractionInput,
  free,
  freeWith,
  gaussianProfile,
  heldAt,
  rateInput,
  SHARED_SET,
  uniformEdges,
} from './support/scans';

const truth = { edgeDepthNm: 75, edgeWidthNm: 16, levelTop: 0.74, levelBulk: 0.32, levelCap: 0.5 };
const rateTruth = { edgeDepthNm: 75, edgeWidthNm: 16, levelTop: 0.05, levelBulk: 3 };

function scanOf(
  template: FitInput,
  values: Parameters<typeof simulateScan>[0]['values'],
  seed = 1,
): FitInput {
  return { ...template, points: simulateScan({ input: template, values, seed }) };
}

const answer = (input: FitInput) => answerOf(fit(prepareFit(input)));
const parameter = (input: FitInput, name: ParameterName) =>
  answer(input).parameters.find((p) => p.name === name)!;

function codeOf(act: () => unknown): string {
  try {
    act();
  } catch (error) {
    if (error instanceof InversionError) return error.code;
    throw error;
  }
  return 'nothing thrown';
}

describe('a fit', () => {
  // Source: without noise the truth is the minimum, χ² = 0.
  it.each([
    ['fraction', fractionInput(), truth],
    ['fraction behind a cap', fractionInput({ capThicknessNm: 10 }), truth],
    ['rate', rateInput(), rateTruth],
    [
      'rate under accumulation',
      rateInput({ polarity: 'accumulation' }),
      { ...rateTruth, levelTop: 3, levelBulk: 0.05 },
    ],
  ])('finds a %s scan without noise exactly', (_, template, values) => {
    const expected = foldScan(
      prepareFit({ ...template, points: template.points.map((p) => ({ ...p, value: 0.5 })) }),
      values,
    );
    const found = answer({
      ...template,
      points: template.points.map((p, i) => ({ ...p, value: expected[i]! })),
    });
    expect(found.chiSquare).toBeLessThan(1e-9);
    for (const p of found.parameters) {
      if (p.name !== 'depthScale')
        expect(p.value).toBeCloseTo(values[p.name as keyof typeof values]!, 4);
    }
  });

  // Source: definitions. AICc: Hurvich and Tsai, Biometrika 76, 297 (1989). BIC: Schwarz, Ann. Stat. 6, 461 (1978).
  it('counts points, priors and parameters', () => {
    const input = scanOf(
      fractionInput({
        parameters: { levelBulk: freeWith(0.32, 0.02), depthScale: free, levelTop: heldAt(0.74) },
      }),
      truth,
    );
    const found = answer(input);
    // 13 points + 2 priors; free: edge, width, bulk, depth scale.
    expect(found.freeParameters).toBe(4);
    expect(found.degreesOfFreedom).toBe(11);
    expect(found.aicc).toBeCloseTo(found.chiSquare + 8 + 40 / 10, 12);
    expect(found.bic).toBeCloseTo(found.chiSquare + 4 * Math.log(15), 12);
    const data = found.residuals.reduce((sum, { reduced }) => sum + reduced ** 2, 0);
    expect(found.dataChiSquare).toBeCloseTo(data, 10);
    const bulk = found.parameters.find((p) => p.name === 'levelBulk')!.value;
    const scale = found.parameters.find((p) => p.name === 'depthScale')!.value;
    expect(found.chiSquare).toBeCloseTo(
      data + ((bulk - 0.32) / 0.02) ** 2 + ((scale - 1) / 0.03) ** 2,
      9,
    );
  });

  it('is not changed by the order of the points, to the last bit', () => {
    fc.assert(
      fc.property(
        fc.shuffledSubarray([...Array(13).keys()], { minLength: 13 }),
        fc.constantFrom('sharp' as const, 'graded' as const),
        (order, profile) => {
          const input = scanOf(fractionInput({ profile }), truth);
          const shuffled = answer({ ...input, points: order.map((i) => input.points[i]!) });
          const straight = answer(input);
          expect(shuffled.parameters).toEqual(straight.parameters);
          expect(shuffled.chiSquare).toBe(straight.chiSquare);
          expect(shuffled.residuals[0]).toEqual(straight.residuals[order[0]!]);
        },
      ),
      { numRuns: 10, seed: 3 },
    );
  });

  it('keeps whatever is held where it is held', () => {
    const values: [ParameterName, number][] = [
      ['edgeDepthNm', 71.5],
      ['edgeWidthNm', 12.25],
      ['levelTop', 0.73],
      ['levelBulk', 0.3],
      ['levelCap', 0.45],
      ['depthScale', 1.02],
    ];
    for (const [name, value] of values) {
      const input = scanOf(
        fractionInput({
          capThicknessNm: 8,
          parameters: { depthScale: free, [name]: heldAt(value) },
        }),
        truth,
      );
      const held = parameter(input, name);
      expect(held).toMatchObject({ name, value, held: true, sigma: null, atBound: null });
      expect(answer(input).covariance).toMatchObject({ ok: true });
    }
  });

  it('rescales with the unit of the rate', () => {
    const input = scanOf(
      rateInput({
        response: {
          kind: 'capture-rate',
          gammaCm3PerS: 1e-6,
          gammaSigmaCm3PerS: null,
          baselinePerUs: 0,
        },
      }),
      rateTruth,
    );
    const times = answer({
      ...input,
      points: input.points.map((p) => ({ ...p, value: 50 * p.value, sigma: 50 * p.sigma })),
    });
    const once = answer(input);
    expect(times.chiSquare).toBeCloseTo(once.chiSquare, 8);
    for (const [k, p] of times.parameters.entries()) {
      const factor = p.name.startsWith('level') ? 50 : 1;
      expect(p.value / factor).toBeCloseTo(once.parameters[k]!.value, 4);
      if (p.interval68[0] !== null)
        expect(p.interval68[0] / factor).toBeCloseTo(once.parameters[k]!.interval68[0]!, 2);
    }
  });

  it('leaves points that are switched off out, and predicts them all the same', () => {
    const input = scanOf(fractionInput(), truth);
    const spoiled = {
      ...input,
      points: input.points.map((p, i) => (i === 4 ? { ...p, value: 40, enabled: false } : p)),
    };
    const without = { ...input, points: input.points.filter((_, i) => i !== 4) };
    expect(answer(spoiled).chiSquare).toBeCloseTo(answer(without).chiSquare, 9);
    expect(answer(spoiled).residuals[4]).toMatchObject({ enabled: false, observed: 40 });
    expect(answer(spoiled).residuals[4]!.predicted).toBeLessThan(0.75);
    expect(answer(spoiled).degreesOfFreedom).toBe(8);
  });

  it('ignores a switched-off point outside the stopping set, and marks interpolated ones', () => {
    const input = scanOf(fractionInput(), truth);
    const outside = { energyKeV: 30, value: 0.3, sigma: 0.01, enabled: false };
    const between = { energyKeV: 7, value: 0.7, sigma: 0.5, enabled: true };
    const prepared = prepareFit({ ...input, points: [outside, ...input.points, between] });
    const found = answerOf(fit(prepared));
    expect(found.residuals).toHaveLength(14);
    expect(found.residuals[13]).toMatchObject({ energyKeV: 7, interpolated: true });
    expect(foldScan(prepared, valuesOf(found))[0]).toBeNaN();
    expect(
      codeOf(() =>
        prepareFit({ ...input, points: [{ ...outside, enabled: true }, ...input.points] }),
      ),
    ).toBe('energy-outside-stopping-set');
  });

  // Source: derivation in physics: without a cap data depend on W/a and w/a only, so a keeps its prior and W inherits 3 %.
  it('passes the error of the depth scale on to the edge', () => {
    const input = scanOf(fractionInput({}, 0.001), truth);
    const held = answer(input);
    const scaled = answer({ ...input, parameters: { depthScale: free } });
    const edge = (a: typeof held) => a.parameters[0]!;
    expect(edge(scaled).value).toBeCloseTo(edge(held).value, 5);
    expect(scaled.parameters.find((p) => p.name === 'depthScale')!.sigma).toBeCloseTo(0.03, 8);
    expect(edge(scaled).sigma).toBeCloseTo(
      Math.hypot(edge(held).sigma!, 0.03 * edge(held).value),
      3,
    );
  });

  it('keeps fractions in [0, 1] and rates at or above the rate without carriers', () => {
    const fraction = answer(
      scanOf(fractionInput({}, 0.02), { ...truth, levelTop: 1, levelBulk: 0 }, 5),
    );
    const rate = answer(scanOf(rateInput({}, 0.2), { ...rateTruth, levelTop: 0.01 }, 3));
    for (const [found, low, high] of [
      [fraction, 0, 1],
      [rate, 0.01, Infinity],
    ] as const) {
      for (const p of found.parameters.filter(({ name }) => name.startsWith('level'))) {
        for (const end of [p.value, ...p.interval68, ...p.interval95]) {
          if (end === null) continue;
          expect(end).toBeGreaterThanOrEqual(low);
          expect(end).toBeLessThanOrEqual(high);
        }
      }
    }
    expect(
      [fraction, rate].flatMap((found) =>
        found.parameters.filter(({ atBound }) => atBound !== null),
      ).length,
    ).toBeGreaterThan(0);
  });

  it('says so when the scan does not show an edge', () => {
    const flat = fractionInput({
      points: fractionInput().points.map((p) => ({ ...p, value: 0.5 })),
    });
    const outcome = fit(prepareFit(flat));
    expect(outcome.status).toBe('no-minimum');
    expect(outcome).toHaveProperty('reason', expect.stringContaining('where the edge is'));
  });

  it('opens the interval of an edge that lies deeper than the scan can close', () => {
    const input = scanOf(
      fractionInput({ profile: 'sharp', parameters: { levelBulk: freeWith(0.3, 0.05) } }, 0.01),
      { ...truth, edgeDepthNm: 215 },
      2,
    );
    const edge = parameter(input, 'edgeDepthNm');
    expect(edge.interval95[0]).toBeGreaterThan(100);
    expect(edge.interval95[1]).toBeNull();
    expect(edge.symmetric).toBe(false);
  });

  it('ends the interval of a width at zero', () => {
    const width = parameter(
      scanOf(fractionInput({}, 0.008), { ...truth, edgeWidthNm: 0.5 }, 9),
      'edgeWidthNm',
    );
    expect(width.interval95[0]).toBe(0);
    expect(width.interval95[1]).toBeGreaterThan(2);
    expect(width.symmetric).toBe(false);
  });

  it.each<[string, Partial<FitInput>]>([
    ['empty-scan', { points: [] }],
    ['empty-scan', { points: fractionInput().points.map((p) => ({ ...p, enabled: false })) }],
    ['bad-sigma', { points: [{ energyKeV: 5, value: 0.5, sigma: 0, enabled: true }] }],
    ['bad-sigma', { points: [{ energyKeV: 5, value: 0.5, sigma: NaN, enabled: true }] }],
    ['bad-value', { points: [{ energyKeV: 5, value: NaN, sigma: 1, enabled: true }] }],
    ['bad-energy', { points: [{ energyKeV: -5, value: 0.5, sigma: 1, enabled: true }] }],
    [
      'duplicate-energy',
      {
        points: [5, 6, 5].map((energyKeV) => ({ energyKeV, value: 0.5, sigma: 1, enabled: true })),
      },
    ],
    ['too-few-points', { points: fractionInput().points.slice(0, 3) }],
    [
      'too-many-points',
      {
        points: Array.from({ length: 201 }, (_, k) => ({
          energyKeV: 2 + k / 20,
          value: 0.5,
          sigma: 1,
          enabled: true,
        })),
      },
    ],
    ['empty-stopping-set', { stopping: { profiles: [] } }],
    ['wrong-response', { observable: 'rate' }],
    [
      'wrong-response',
      {
        response: {
          kind: 'capture-rate',
          gammaCm3PerS: 1e-6,
          gammaSigmaCm3PerS: null,
          baselinePerUs: 0,
        },
      },
    ],
    [
      'bad-gamma',
      {
        observable: 'rate',
        response: {
          kind: 'capture-rate',
          gammaCm3PerS: 0,
          gammaSigmaCm3PerS: null,
          baselinePerUs: 0,
        },
      },
    ],
    [
      'bad-baseline',
      {
        observable: 'rate',
        response: {
          kind: 'capture-rate',
          gammaCm3PerS: 1e-6,
          gammaSigmaCm3PerS: null,
          baselinePerUs: -1,
        },
      },
    ],
    ['bad-concentration', { carriers: { bulkPerCm3: -1, bulkSigmaPerCm3: null, topPerCm3: null } }],
    ['bad-cap', { capThicknessNm: -2 }],
    ['cap-too-thick', { capThicknessNm: 400 }],
    ['no-held-value', { parameters: { levelTop: { held: true, value: null, prior: null } } }],
    ['held-out-of-bounds', { parameters: { levelTop: heldAt(1.2) } }],
    ['bad-prior', { parameters: { levelTop: freeWith(0.5, 0) } }],
  ])('is refused as %s', (code, change) => {
    expect(codeOf(() => prepareFit(fractionInput(change)))).toBe(code);
  });
});

describe('the carrier profile', () => {
  const input = scanOf(fractionInput({}, 0.004), truth);

  it('is the populated share of a fraction, or cm⁻³ where the concentrations are known', () => {
    const at = (change: Partial<FitInput>) => {
      const prepared = prepareFit({ ...input, ...change });
      const profile = carrierProfile(prepared, answerOf(fit(prepared)), null, {
        depthsNm: [0, 175],
      });
      return { unit: profile.unit, values: profile.points.map(({ value }) => value) };
    };
    const share = at({});
    expect(share.unit).toBe('populated share');
    expect(share.values[0]).toBeCloseTo(0, 4);
    expect(share.values[1]).toBeCloseTo(1, 4);
    expect(at({ polarity: 'accumulation' }).values[0]).toBeCloseTo(1 - share.values[0]!, 12);
    const scale = { bulkPerCm3: 4e15, bulkSigmaPerCm3: null, topPerCm3: null };
    expect(at({ carriers: scale }).values[1]! / (4e15 * share.values[1]!)).toBeCloseTo(1, 12);
    const accumulated = at({ carriers: { ...scale, topPerCm3: 9e15 }, polarity: 'accumulation' });
    expect(accumulated.unit).toBe('cm⁻³');
    expect(accumulated.values[0]! / 9e15).toBeCloseTo(1, 4);
    expect(at({ carriers: scale, polarity: 'accumulation' }).unit).toBe('populated share');
  });

  // Source: p = (Λ − Λ₀)/γ; 1 µs⁻¹ per 10¹² cm⁻³ for γ = 1e-6 cm³/s.
  it('is (Λ − Λ₀)/γ of a rate', () => {
    const prepared = prepareFit(scanOf(rateInput(), rateTruth));
    const found = answerOf(fit(prepared));
    const profile = carrierProfile(prepared, found, null, { depthsNm: [0, 190] });
    const { levelBulk, levelTop } = valuesOf(found);
    expect(profile.points[1]!.value / ((levelBulk! - 0.01) * 1e12)).toBeCloseTo(1, 6);
    // A millionth of the bulk reaches the surface through the tail of the edge.
    expect(Math.abs(profile.points[0]!.value - (levelTop! - 0.01) * 1e12)).toBeLessThan(
      1e-3 * levelBulk! * 1e12,
    );
  });

  // Source: definition of reach and floor; the floor is computed again here from the fold with levels 0 and 1.
  it('flags depths beyond reach and values below the floor', () => {
    const prepared = prepareFit(input);
    const found = answerOf(fit(prepared));
    const profile = carrierProfile(prepared, found);
    const reachNm = stoppingQuantile(SHARED_SET.profiles[12]!, 0.95);
    expect(profile.reachNm).toBeCloseTo(reachNm, 10);
    const values = valuesOf(found);
    const poor = foldScan(prepared, { ...values, levelTop: 1, levelBulk: 0 });
    const floor = Math.min(
      ...poor.map((share) => 0.004 / (Math.abs(values.levelBulk! - values.levelTop!) * share)),
    );
    expect(profile.floor).toBeCloseTo(floor, 12);
    for (const { depthNm, value, flag } of profile.points) {
      expect(flag).toBe(
        depthNm > reachNm ? 'beyond reach' : value < floor ? 'below floor' : 'supported',
      );
    }
    expect(new Set(profile.points.map(({ flag }) => flag)).size).toBe(3);
    expect(profile.points.length).toBeLessThanOrEqual(400);
    expect(profile.points[0]!.depthNm).toBe(0);
  });

  it('counts depth from below the cap', () => {
    const capped = scanOf(fractionInput({ capThicknessNm: 20 }, 0.004), truth);
    const prepared = prepareFit(capped);
    const profile = carrierProfile(prepared, answerOf(fit(prepared)));
    expect(profile.reachNm).toBeCloseTo(stoppingQuantile(SHARED_SET.profiles[12]!, 0.95) - 20, 10);
  });
});

describe('what the scan knows', () => {
  // Source: one Gaussian stopping profile: the information about depth x goes as its density squared, largest at its mean.
  it('of each depth follows the stops', () => {
    const stopping = createStoppingSet([gaussianProfile(5, uniformEdges(160, 1), 60, 12)]);
    const points = [{ energyKeV: 5, value: 0.5, sigma: 0.01, enabled: true }];
    const parameters = { edgeDepthNm: heldAt(50), edgeWidthNm: heldAt(5), levelBulk: heldAt(0.3) };
    const prepared = prepareFit(fractionInput({ stopping, points, parameters }));
    const depths = Array.from({ length: 121 }, (_, k) => k + 0.5);
    const information = depthInformation(prepared, answerOf(fit(prepared)), depths);
    expect(information.indexOf(1)).toBe(60 - 1);
    expect(information[72 - 1]!).toBeCloseTo(Math.exp(-1), 1);
    expect(Math.max(...information)).toBe(1);
  });

  it('of the edge adds up to one over the points in use', () => {
    const input = scanOf(fractionInput({}, 0.004), truth);
    const points = input.points.map((p, i) => ({ ...p, enabled: i !== 3 }));
    const prepared = prepareFit({ ...input, points });
    const shares = edgeInformationByEnergy(prepared, answerOf(fit(prepared)));
    expect(shares.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 10);
    expect(shares[3]).toBe(0);
    expect(shares).toHaveLength(13);
  });

  // Source: envelope theorem: the information I = min_β Σ w_i (J_i − A_i β)², w = 1/σ², has ∂ln I/∂ln w_i = share of point i, and
  // I = 1/σ_W². Without noise the minimum stays where it is when one σ changes; the difference is good to 1e-4.
  it('of the edge is what each point adds to its error bar', () => {
    const template = fractionInput({}, 0.004);
    const exact = foldScan(prepareFit({ ...template, points: input0().points }), truth);
    const at = (row: number, factor: number) => {
      const points = template.points.map((p, i) => ({
        ...p,
        value: exact[i]!,
        sigma: i === row ? p.sigma / Math.sqrt(factor) : p.sigma,
      }));
      const prepared = prepareFit({ ...template, points });
      return { prepared, found: answerOf(fit(prepared, { intervalsFor: [] })) };
    };
    const { prepared, found } = at(0, 1);
    const shares = edgeInformationByEnergy(prepared, found);
    for (const row of [2, 5, 7, 9, 12]) {
      const lnInformation = (factor: number): number =>
        -2 * Math.log(at(row, factor).found.parameters[0]!.sigma!);
      expect((lnInformation(1.01) - lnInformation(0.99)) / Math.log(1.01 / 0.99)).toBeCloseTo(
        shares[row]!,
        3,
      );
    }
  });
});

const input0 = (): FitInput => scanOf(fractionInput(), truth);
