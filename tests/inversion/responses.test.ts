import erfc from '@stdlib/math-base-special-erfc';
import { describe, expect, it } from 'vitest';
import {
  MATERIALS,
  calibrationErrors,
  captureCoefficient,
  carrierProfile,
  fit,
  foldScan,
  prepareFit,
  runChecks,
  simulateScan,
  thermalVelocity,
  valuesOf,
  type FitInput,
} from '@/lib/inversion/index';
import { answerOf, fractionInput, heldAt, rateInput } from './support/scans';

const exact = (value: number) => ({ value, sigma: 0 });
const EDGE = { edgeDepthNm: 75, edgeWidthNm: 14, levelTop: 0.74, levelBulk: 0.32 };

function saturating(halfPerCm3: number, change: Partial<FitInput> = {}): FitInput {
  return fractionInput(
    {
      response: { kind: 'saturating-fraction', halfPerCm3, halfSigmaPerCm3: null },
      carriers: { bulkPerCm3: 1e17, bulkSigmaPerCm3: null, topPerCm3: null },
      ...change,
    },
    0.003,
  );
}

/** The input with points simulated from itself. */
function measured(input: FitInput, values: typeof EDGE, seed = 1): FitInput {
  return { ...input, points: simulateScan({ input, values, seed }) };
}

describe('the capture coefficient from a cross-section', () => {
  // Source: mean speed of a Maxwell distribution, √(8kT/πm); CODATA 2022 constants, worked out by hand: electrons of free mass at
  // 300 K move at 1.076e7 cm/s (Sze, Physics of Semiconductor Devices, states about 1e7 cm/s for 300 K).
  it('uses the mean thermal speed', () => {
    const free = thermalVelocity({ effectiveMass: exact(1), temperatureK: exact(300) });
    expect(free.value).toBeCloseTo(
      100 * Math.sqrt((8 * 1.380649e-23 * 300) / (Math.PI * 9.1093837139e-31)),
      3,
    );
    expect(free.value / 1.0761e7).toBeCloseTo(1, 3);
  });

  it('is γ = σ_c·v_th with its uncertainty', () => {
    const { value, sigma } = captureCoefficient({
      crossSectionCm2: { value: 5e-14, sigma: 5e-15 },
      effectiveMass: { value: MATERIALS.Ge.holeMass.value, sigma: 0.033 },
      temperatureK: exact(200),
    });
    const speed = 1.0761e7 * Math.sqrt(200 / 300 / 0.33);
    expect(value / (5e-14 * speed)).toBeCloseTo(1, 3);
    // 10 % of the cross-section and half of 10 % of the mass.
    expect(sigma / value).toBeCloseTo(Math.hypot(0.1, 0.05), 6);
  });

  it('refuses what cannot be', () => {
    const input = {
      crossSectionCm2: exact(1e-14),
      effectiveMass: exact(0.3),
      temperatureK: exact(200),
    };
    for (const name of ['crossSectionCm2', 'effectiveMass', 'temperatureK'] as const)
      expect(() => captureCoefficient({ ...input, [name]: exact(-1) })).toThrow(
        expect.objectContaining({ code: 'bad-number' }),
      );
  });
});

describe('the saturating fraction', () => {
  it('is the two-level fraction where p_half lies far above every concentration', () => {
    const far = foldScan(prepareFit(saturating(1e25)), EDGE);
    const plain = foldScan(prepareFit(fractionInput()), EDGE);
    far.forEach((value, i) => expect(Math.abs(value - plain[i]!)).toBeLessThan(1e-7));
  });

  // F = F_pop + (F_free − F_pop)/(1 + p/p_half) written out for one thin stop; levels at s = 0 and 1 fix F_free and F_pop.
  it('has half of its contrast where p crosses p_half, in front of the edge of the carriers', () => {
    const input = saturating(1e16);
    const shift = (edge: number): number[] => [
      ...foldScan(prepareFit(input), { ...EDGE, edgeDepthNm: edge }),
    ];
    const plain = [...foldScan(prepareFit(fractionInput()), { ...EDGE, edgeDepthNm: 75 })];
    // g(s) = ½ at s = 1/(2 + K), K = 10: 1.38 widths in front of the middle of the edge.
    const distance = (edge: number): number =>
      shift(edge).reduce((sum, value, i) => sum + (value - plain[i]!) ** 2, 0);
    const edges = Array.from({ length: 61 }, (_, k) => 75 + k);
    const best = edges.reduce((a, b) => (distance(b) < distance(a) ? b : a));
    expect(best - 75).toBeGreaterThan(14);
    expect(best - 75).toBeLessThan(26);
  });

  it('gives the edge of the carriers back, and the concentration', () => {
    const input = measured(saturating(1e16), EDGE, 4);
    const prepared = prepareFit(input);
    const answer = answerOf(fit(prepared));
    const edge = answer.parameters[0]!;
    expect(Math.abs(edge.value - 75) / edge.sigma!).toBeLessThan(3);
    const profile = carrierProfile(prepared, answer);
    expect(profile.unit).toBe('cm⁻³');
    const { edgeDepthNm, edgeWidthNm, levelTop, levelBulk } = valuesOf(answer);
    // p(x) = p_bulk·Φ((x − W)/w), written out. Tolerance: the table of Φ is good to 1e-11.
    for (const { depthNm, value } of profile.points) {
      const share = erfc((edgeDepthNm! - depthNm) / edgeWidthNm! / Math.SQRT2) / 2;
      expect(Math.abs(value / 1e17 - share)).toBeLessThan(1e-9);
    }
    // F falls by (F_free − F_pop)/p_half per carrier where there are none, and the levels span 10/11 of F_free − F_pop.
    const poor = foldScan(prepared, { ...valuesOf(answer), levelTop: 1, levelBulk: 0 });
    const slope = ((levelTop! - levelBulk!) * 11) / 10 / 1e16;
    expect(profile.floor! / (0.003 / (Math.max(...poor) * slope))).toBeCloseTo(1, 9);
    const checks = runChecks(prepared, answer, profile);
    // The concentrations bend the edge, so that its depth and width go together; all else is sound.
    expect(checks.filter(({ state }) => state !== 'fine').map(({ id }) => id)).toEqual([
      'correlation',
    ]);
    const stated = (id: string, words: RegExp): number =>
      Number(words.exec(checks.find((check) => check.id === id)!.message)![1]);
    const { covariance } = answer;
    if (!covariance.ok) throw new Error(covariance.reason);
    const strongest = Math.max(
      ...covariance.correlation.flatMap((row, k) => row.slice(0, k).map(Math.abs)),
    );
    expect(Math.abs(stated('correlation', /is (0\.\d+), between/) - strongest)).toBeLessThan(0.006);
    // Depths scale with the stopping calculation: 3 % of it are 3 % of the edge. Three figures are stated.
    const moved = stated('depth-scale', /edge by ([\d.]+) nm/);
    expect(Math.abs(moved - 0.03 * edgeDepthNm!)).toBeLessThan(0.006);
  });

  it('read as two levels, puts the edge where p crosses p_half instead', () => {
    const input = measured(saturating(1e16), EDGE, 4);
    const plain = answerOf(fit(prepareFit({ ...input, response: { kind: 'two-level' } })));
    expect(plain.parameters[0]!.value).toBeLessThan(65);
  });

  it('needs to know both concentrations', () => {
    const none = { bulkPerCm3: null, bulkSigmaPerCm3: null, topPerCm3: null };
    const refused = (input: FitInput, code: string): void =>
      expect(() => prepareFit(input)).toThrow(expect.objectContaining({ code }));
    refused(saturating(1e16, { carriers: none }), 'no-bulk-concentration');
    refused(saturating(1e16, { polarity: 'accumulation' }), 'no-bulk-concentration');
    refused(saturating(0), 'bad-half-concentration');
    refused(saturating(NaN), 'bad-half-concentration');
    refused(
      saturating(1e16, {
        response: { kind: 'saturating-fraction', halfPerCm3: 1e16, halfSigmaPerCm3: -1 },
      }),
      'bad-half-concentration',
    );
    refused({ ...rateInput(), response: saturating(1e16).response }, 'wrong-response');
  });
});

describe('the uncertainty of a calibration', () => {
  it('of γ scales the profile and moves nothing else, apart from the band', () => {
    const gamma = { kind: 'capture-rate', gammaCm3PerS: 1e-6, baselinePerUs: 0.01 } as const;
    const input = measured(rateInput({ response: { ...gamma, gammaSigmaCm3PerS: 2e-7 } }), {
      ...EDGE,
      levelTop: 0.1,
      levelBulk: 2,
    });
    const prepared = prepareFit(input);
    const answer = answerOf(fit(prepared));
    const [error, ...others] = calibrationErrors(prepared, answer, [10, 75, 150]);
    expect(others).toEqual([]);
    expect(error).toMatchObject({ source: 'capture coefficient' });
    expect(error!.relativeSigma).toBeCloseTo(0.2, 12);
    const value = carrierProfile(prepared, answer, null, { depthsNm: [10, 75, 150] }).points;
    value.forEach((point, k) => {
      expect(error!.low!.profile[k]! / point.value).toBeCloseTo(1 / 0.8, 6);
      expect(error!.high!.profile[k]! / point.value).toBeCloseTo(1 / 1.2, 6);
    });
    expect(error!.high!.values.edgeDepthNm).toBeCloseTo(answer.parameters[0]!.value, 6);
    const silent = prepareFit({ ...input, response: { ...gamma, gammaSigmaCm3PerS: null } });
    const bands = carrierProfile(silent, answerOf(fit(silent)), null, { depthsNm: [10, 75, 150] });
    bands.points.forEach((point, k) => expect(point.upper68).toBeCloseTo(value[k]!.upper68!, -5));
    expect(calibrationErrors(silent, answer)).toEqual([]);
  });

  it('of p_half moves the edge, and of the bulk scales a two-level profile', () => {
    const half = measured(
      saturating(1e16, {
        response: { kind: 'saturating-fraction', halfPerCm3: 1e16, halfSigmaPerCm3: 4e15 },
        carriers: { bulkPerCm3: 1e17, bulkSigmaPerCm3: 1e16, topPerCm3: null },
      }),
      EDGE,
    );
    const prepared = prepareFit(half);
    const answer = answerOf(fit(prepared));
    const errors = calibrationErrors(prepared, answer);
    expect(errors.map(({ source }) => source)).toEqual([
      'half-saturation concentration',
      'bulk concentration',
    ]);
    const edge = answer.parameters[0]!.value;
    const [low, high] = [errors[0]!.low!, errors[0]!.high!].map(
      ({ values }) => values.edgeDepthNm!,
    );
    expect((low! - edge) * (high! - edge)).toBeLessThan(0);
    expect(Math.abs(high! - low!)).toBeGreaterThan(1);
    const plain = prepareFit(
      measured(
        fractionInput(
          { carriers: { bulkPerCm3: 1e17, bulkSigmaPerCm3: 2e17, topPerCm3: null } },
          0.004,
        ),
        EDGE,
      ),
    );
    const [bulk] = calibrationErrors(plain, answerOf(fit(plain)), [150]);
    // One σ below there would be no carriers left.
    expect(bulk!.low).toBeNull();
    expect(bulk!.high!.profile[0]! / 3e17).toBeCloseTo(1, 3);
  });
});

describe('band bending', () => {
  const semiconductor = { relativePermittivity: 16.2, temperatureK: 200, intrinsicPerCm3: 1e10 };
  const bent = (change: Partial<FitInput> = {}): FitInput =>
    rateInput({
      profile: 'band-bending',
      semiconductor,
      carriers: { bulkPerCm3: 2e16, bulkSigmaPerCm3: 2e15, topPerCm3: null },
      ...change,
    });
  const values = { surfacePotentialEv: 0.12, bulkPerCm3: 2e16, levelTop: 0.01, levelBulk: 2 };

  it('gives the bending back, knows the rate without carriers, and tells what the doping does to it', () => {
    const input = { ...bent(), points: simulateScan({ input: bent(), values, seed: 2 }) };
    const prepared = prepareFit(input);
    const answer = answerOf(fit(prepared));
    const [bending, bulk, top] = answer.parameters;
    expect(bending!.name).toBe('surfacePotentialEv');
    expect(Math.abs(bending!.value - 0.12) / bending!.sigma!).toBeLessThan(3);
    expect(bulk).toMatchObject({ name: 'bulkPerCm3', held: true, value: 2e16 });
    expect(top).toMatchObject({ name: 'levelTop', held: true, value: 0.01 });
    const [error] = calibrationErrors(prepared, answer);
    // W² ∝ φ_s/N at a given depth of the carriers: 10 % more doping asks for about 10 % more bending.
    expect(error!.high!.values.surfacePotentialEv! / bending!.value).toBeGreaterThan(1.04);
    expect(error!.high!.values.surfacePotentialEv! / bending!.value).toBeLessThan(1.16);
    const profile = carrierProfile(prepared, answer);
    const checks = runChecks(prepared, answer, profile);
    expect(checks.find(({ id }) => id === 'edge-reach')!.message).toMatch(/half of the bulk at \d/);
    expect(checks.some(({ id }) => id === 'polarity')).toBe(false);
    expect(checks.find(({ id }) => id === 'leave-one-out')!.message).toMatch(
      /band bending moves to .* eV/,
    );
  });

  it('can leave the doping free with a prior', () => {
    const free = bent({
      parameters: { bulkPerCm3: { held: false, value: null, prior: { mean: 2e16, sigma: 3e15 } } },
    });
    const input = { ...free, points: simulateScan({ input: free, values, seed: 2 }) };
    const answer = answerOf(fit(prepareFit(input)));
    const held = answerOf(fit(prepareFit({ ...input, parameters: {} })));
    expect(answer.parameters[1]!.held).toBe(false);
    expect(answer.parameters[0]!.sigma!).toBeGreaterThan(held.parameters[0]!.sigma!);
  });

  it('refuses what it cannot do, saying why', () => {
    const refused = (change: Partial<FitInput>, code: string): void =>
      expect(() => prepareFit(bent(change))).toThrow(expect.objectContaining({ code }));
    refused({ semiconductor: null }, 'no-semiconductor');
    refused({ semiconductor: { ...semiconductor, temperatureK: 0 } }, 'bad-semiconductor');
    refused({ semiconductor: { ...semiconductor, intrinsicPerCm3: NaN } }, 'bad-semiconductor');
    refused(
      { carriers: { bulkPerCm3: null, bulkSigmaPerCm3: null, topPerCm3: null } },
      'no-bulk-concentration',
    );
    refused({ parameters: { surfacePotentialEv: heldAt(-0.1) } }, 'held-out-of-bounds');
    expect(() =>
      prepareFit({
        ...fractionInput(),
        profile: 'band-bending',
        semiconductor,
        polarity: 'accumulation',
      }),
    ).toThrow(expect.objectContaining({ code: 'wrong-response' }));
    expect(() => prepareFit({ ...bent(), profile: 'parabola' as 'sharp' })).toThrow(
      expect.objectContaining({ code: 'unknown-profile' }),
    );
    const prepared = prepareFit(bent());
    expect(() => foldScan(prepared, { ...values, surfacePotentialEv: -0.2 })).toThrow(
      expect.objectContaining({ code: 'bad-value' }),
    );
  });
});
