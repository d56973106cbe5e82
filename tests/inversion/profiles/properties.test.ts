import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  createStoppingProfile,
  createStoppingSet,
  fit,
  foldScan,
  prepareFit,
  simulateScan,
  type FitInput,
  type ParameterName,
  type StoppingSet,
} from '@/lib/inversion/index';
import { compileInput } from '@/lib/inversion/fit/prepare-fit';
import { answerOf, uniforms } from '../support/scans';
import { PROFILE_CASES } from './support';

const CASES = PROFILE_CASES.map((one) => [one.name, one] as const);
const runs = { numRuns: 12, seed: 20260115 };
const level = fc.double({ min: 0, max: 1, noNaN: true });

/** The same muons on bins of which some are cut in two. */
function withSplitBins(set: StoppingSet, seed: number): StoppingSet {
  const random = uniforms(seed);
  const [{ edgesNm }] = set.profiles as [StoppingSet['profiles'][number]];
  const cuts = Array.from(edgesNm.slice(1), () =>
    random.next() < 0.2 ? random.between(0.1, 0.9) : null,
  );
  const edges = [edgesNm[0]!];
  cuts.forEach((cut, b) => {
    if (cut !== null) edges.push(edgesNm[b]! + cut * (edgesNm[b + 1]! - edgesNm[b]!));
    edges.push(edgesNm[b + 1]!);
  });
  return createStoppingSet(
    set.profiles.map(({ energyKeV, mass }) =>
      createStoppingProfile({
        energyKeV,
        positionsNm: edges,
        positionsAre: 'edges',
        weights: cuts.flatMap((cut, b) =>
          cut === null ? [mass[b]!] : [cut * mass[b]!, (1 - cut) * mass[b]!],
        ),
        weightsAre: 'counts',
      }),
    ),
  );
}

/** Points (and their covariance) in another order. */
function permuted(input: FitInput, seed: number): { input: FitInput; order: number[] } {
  const random = uniforms(seed);
  const keys = input.points.map(() => random.next());
  const order = Array.from(keys.keys()).sort((a, b) => keys[a]! - keys[b]!);
  const points = order.map((i) => input.points[i]!);
  const covariance = input.covariance
    ? order.map((i) => order.map((j) => input.covariance![i]![j]!))
    : null;
  return { input: { ...input, points, covariance }, order };
}

describe('every trial profile under every response', () => {
  // Source: ŷ = top·(1 − q − G) + bulk·G + cap·q by definition.
  it.each(CASES)('%s: folds linearly in the levels', (_, { input, values }) => {
    const prepared = compileInput(input);
    const at = (levelTop: number, levelBulk: number, levelCap: number): Float64Array =>
      foldScan(prepared, { ...values, levelTop, levelBulk, levelCap });
    const [top, bulk, cap] = [at(1, 0, 0), at(0, 1, 0), at(0, 0, 1)];
    fc.assert(
      fc.property(level, level, level, (a, b, c) => {
        at(a, b, c).forEach((value, i) => {
          const parts = a * top[i]! + b * bulk[i]! + (input.capThicknessNm > 0 ? c * cap[i]! : 0);
          expect(value).toBeCloseTo(parts, 11);
        });
      }),
      runs,
    );
  });

  // Source: a uniform bin cut in two with its mass in proportion is the same density. Tolerance: of the quadrature, and of bent bands.
  it.each(CASES)('%s: does not change when bins are split', (_, { input, values }) => {
    const whole = foldScan(compileInput(input), values);
    fc.assert(
      fc.property(fc.nat(1e6), (seed) => {
        const stopping = withSplitBins(input.stopping, seed);
        const split = foldScan(compileInput({ ...input, stopping }), values);
        const tolerance = input.profile === 'band-bending' ? 1e-7 : 1e-10;
        split.forEach((value, i) => expect(Math.abs(value - whole[i]!)).toBeLessThan(tolerance));
      }),
      { numRuns: 2, seed: 3 },
    );
  });

  it.each(CASES)('%s: keeps still what is held, each parameter in turn', (_, { input, values }) => {
    const points = simulateScan({ input, values, seed: 5 });
    const { names } = compileInput(input).problem.model;
    for (const name of names) {
      const value = values[name];
      if (value === undefined) continue;
      const held = { ...input.parameters, [name]: { held: true, value, prior: null } };
      const outcome = fit(prepareFit({ ...input, points, parameters: held }), { intervalsFor: [] });
      if (outcome.status === 'no-minimum') continue;
      const found = outcome.answer.parameters.find((parameter) => parameter.name === name)!;
      expect(found).toMatchObject({ value, held: true, sigma: null });
    }
  });

  it.each(CASES)(
    '%s: fits the same, to the last bit, in any order of its points',
    (_, { input, values }) => {
      const rho = input.points.map(({ sigma: a }, i) =>
        input.points.map(({ sigma: b }, j) => a * b * (i === j ? 1 : 0.3)),
      );
      const scan = { ...input, covariance: rho };
      const points = simulateScan({ input: scan, values, seed: 6 });
      const once = fit(prepareFit({ ...scan, points }), { intervalsFor: [] });
      const again = fit(prepareFit(permuted({ ...scan, points }, 9).input), { intervalsFor: [] });
      expect(once.status).toBe(again.status);
      if (once.status === 'no-minimum') return;
      expect(answerOf(again).parameters).toEqual(answerOf(once).parameters);
    },
  );
});

describe('a layer', () => {
  const edge = fc.double({ min: 0, max: 150, noNaN: true });
  const extent = fc.oneof(fc.constant(0), fc.double({ min: 0.01, max: 60, noNaN: true }));
  const { input } = PROFILE_CASES.find(({ name }) => name === 'layer, both edges sharp')!;
  const prepared = compileInput(input);
  const share = (values: Partial<Record<ParameterName, number>>): Float64Array =>
    foldScan(prepared, { ...values, levelTop: 0, levelBulk: 1, depthScale: 1 });

  it('is a share of the muons, and grows with its thickness', () => {
    fc.assert(
      fc.property(edge, extent, extent, extent, (edgeDepthNm, edgeWidthNm, t, farEdgeWidthNm) => {
        const at = (layerThicknessNm: number): Float64Array =>
          share({ edgeDepthNm, edgeWidthNm, layerThicknessNm, farEdgeWidthNm });
        const [thin, thick] = [at(t), at(t + 3)];
        thin.forEach((value, i) => {
          expect(value).toBeGreaterThanOrEqual(-1e-13);
          expect(value).toBeLessThanOrEqual(1 + 1e-13);
          expect(thick[i]!).toBeGreaterThanOrEqual(value - 1e-13);
        });
      }),
      { numRuns: 80, seed: 20260116 },
    );
  });

  // Source: with equal widths the layer is one edge minus another, by definition.
  it('with equal widths is the difference of two graded edges', () => {
    const graded = compileInput({ ...input, profile: 'graded' });
    fc.assert(
      fc.property(edge, extent, extent, (edgeDepthNm, width, layerThicknessNm) => {
        const one = (depth: number): Float64Array =>
          foldScan(graded, {
            edgeDepthNm: depth,
            edgeWidthNm: width,
            levelTop: 0,
            levelBulk: 1,
            depthScale: 1,
          });
        const [near, far] = [one(edgeDepthNm), one(edgeDepthNm + layerThicknessNm)];
        share({ edgeDepthNm, edgeWidthNm: width, layerThicknessNm, farEdgeWidthNm: width }).forEach(
          (value, i) => expect(value).toBeCloseTo(near[i]! - far[i]!, 12),
        );
      }),
      { numRuns: 100, seed: 20260117 },
    );
  });
});
