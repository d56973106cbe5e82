import erfc from '@stdlib/math-base-special-erfc';
import { Matrix, inverse } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import {
  carrierProfile,
  defaultDepthGrid,
  depthInformation,
  fit,
  prepareFit,
  simulateScan,
  valuesOf,
  type FitAnswer,
  type FitInput,
  type ParameterValues,
  type PreparedFit,
  type StoppingProfile,
} from '@/lib/inversion/index';
import { answerOf, fractionInput, heldAt, rateInput, SHARED_SET, uniforms } from './support/scans';

const TRUTH = { edgeDepthNm: 75, edgeWidthNm: 14, levelTop: 0.74, levelBulk: 0.32 };
const DEEPEST = SHARED_SET.profiles.at(-1)!;

function fitted(
  template: FitInput,
  values: ParameterValues = TRUTH,
  seed = 3,
): { prepared: PreparedFit; answer: FitAnswer; values: ParameterValues } {
  const points = simulateScan({ input: template, values, seed });
  const prepared = prepareFit({ ...template, points });
  const answer = answerOf(fit(prepared));
  return { prepared, answer, values: valuesOf(answer) };
}

/** Depth above which the share u of the stops lies, by adding up 1 nm bins. */
function quantileByHand({ mass }: StoppingProfile, u: number): number {
  let share = 0;
  let bin = 0;
  while (share + mass[bin]! < u) share += mass[bin++]!;
  return bin + (u - share) / mass[bin]!;
}

/** ∫ ρ(x) f(x) dx over the depths (nm, of the file) of one stopping profile with bins of 1 nm: the middle of 100 steps a bin. */
function averageOver({ mass }: StoppingProfile, f: (depthNm: number) => number): number {
  const steps = 100;
  let sum = 0;
  mass.forEach((share, bin) => {
    for (let k = 0; k < steps; k++) sum += (share / steps) * f(bin + (k + 0.5) / steps);
  });
  return sum;
}

/** Φ(t), from the error function of the library of special functions. */
const normalShare = (t: number): number => erfc(-t / Math.SQRT2) / 2;

describe('the reach', () => {
  // Source: the definition; the quantile is added up here from the bins. Tolerance: rounding.
  it.each([
    [1, 0],
    [1.1, 0],
    [1.1, 20],
  ])('at a depth scale of %f is the scaled quantile of the stops less the cap of %i nm', (a, d) => {
    const { prepared, answer } = fitted(
      fractionInput({ capThicknessNm: d, parameters: { depthScale: heldAt(a) } }, 0.004),
      { ...TRUTH, levelCap: 0.5, depthScale: a },
    );
    const { reachNm } = carrierProfile(prepared, answer, null, { depthsNm: [10] });
    expect(reachNm).toBeCloseTo(a * quantileByHand(DEEPEST, 0.95) - d, 9);
  });
});

describe('the floor', () => {
  // Source: brute force. F(p) = A + B/(1 + p/p_half) written out, A and B from the levels; p in front of a sharp edge moved up and
  // down by a ten-thousandth of p_half + p; the share of the stops there added up from the bins. The floor must move the most
  // sensitive point by its σ. Tolerance 1e-6: a central difference of that step is good to 1e-8.
  it.each([0, 5e15, 3e16])(
    'of a saturating fraction moves the most sensitive point by its σ with %d per cm³ left on the poor side',
    (topPerCm3) => {
      const half = 1e16;
      const bulk = 1e17;
      const sigma = 0.003;
      const { prepared, answer, values } = fitted(
        fractionInput(
          {
            profile: 'sharp',
            response: { kind: 'saturating-fraction', halfPerCm3: half, halfSigmaPerCm3: null },
            carriers: { bulkPerCm3: bulk, bulkSigmaPerCm3: null, topPerCm3 },
          },
          sigma,
        ),
        { edgeDepthNm: 75, levelTop: 0.74, levelBulk: 0.32 },
      );
      const { edgeDepthNm: edge, levelTop, levelBulk } = values;
      const free = (p: number): number => 1 / (1 + p / half);
      const b = (levelTop! - levelBulk!) / (free(topPerCm3) - free(bulk));
      const poorShare = ({ mass }: StoppingProfile): number =>
        mass.reduce((sum, share, bin) => sum + share * Math.min(1, Math.max(0, edge! - bin)), 0);
      const step = 1e-4 * (half + topPerCm3);
      const slope = (b * (free(topPerCm3 + step) - free(topPerCm3 - step))) / (2 * step);
      const moved = SHARED_SET.profiles.map((profile) => Math.abs(poorShare(profile) * slope));
      const { floor } = carrierProfile(prepared, answer, null, { depthsNm: [10] });
      expect(Math.abs((floor! * Math.max(...moved)) / sigma - 1)).toBeLessThan(1e-6);
    },
  );

  // Source: the definition, by quadrature over the stopping profiles. Stops in the cap say nothing of the carriers: behind 33 nm
  // most stops of the lowest energies do not count. Tolerance 2e-4: middles of steps of 1/100 nm miss half a step where the cap ends,
  // where a nm holds 2 % of the stops.
  it.each([1, 1.1])('leaves out what stops in a thick cap, depth scale %f', (scale) => {
    const cap = 33;
    const { prepared, answer, values } = fitted(
      fractionInput({ capThicknessNm: cap, parameters: { depthScale: heldAt(scale) } }, 0.004),
      { ...TRUTH, levelCap: 0.5, depthScale: scale },
    );
    const { edgeDepthNm, edgeWidthNm, levelTop, levelBulk } = values;
    const poor = SHARED_SET.profiles.map((profile) =>
      averageOver(profile, (x) => {
        const below = scale * x - cap;
        return below < 0 ? 0 : 1 - normalShare((below - edgeDepthNm!) / edgeWidthNm!);
      }),
    );
    const { floor } = carrierProfile(prepared, answer, null, { depthsNm: [10] });
    const byHand = 0.004 / (Math.abs(levelBulk! - levelTop!) * Math.max(...poor));
    expect(Math.abs(floor! / byHand - 1)).toBeLessThan(2e-4);
  });
});

describe('what the scan tells of each depth', () => {
  const CAP_NM = 20;
  const random = uniforms(5);
  const sigmas = fractionInput().points.map(() => random.between(0.003, 0.012));

  function information(scale: number, covariance: number[][] | null): number[] {
    const template = fractionInput({
      capThicknessNm: CAP_NM,
      covariance,
      parameters: { depthScale: heldAt(scale) },
    });
    const { prepared, answer } = fitted(
      { ...template, points: template.points.map((p, i) => ({ ...p, sigma: sigmas[i]! })) },
      { ...TRUTH, levelCap: 0.5, depthScale: scale },
    );
    // Middles of the bins as they lie below the cap: the mean density of a step is the mass of its bin.
    const depthsNm = Array.from({ length: 150 }, (_, k) => (k + 0.5) * scale);
    return [...depthInformation(prepared, answer, depthsNm)];
  }

  /** ρᵀV⁻¹ρ over its largest, ρ_i the mass of the bin at the depth plus the cap. */
  function byHand(scale: number, v: number[][]): number[] {
    const precision = inverse(new Matrix(v));
    const told = Array.from({ length: 150 }, (_, k) => {
      const density = Matrix.columnVector(
        SHARED_SET.profiles.map(({ mass }) => mass[k + CAP_NM / scale]!),
      );
      return density.transpose().mmul(precision).mmul(density).get(0, 0);
    });
    return told.map((value) => value / Math.max(...told));
  }

  const shared = (rho: number): number[][] =>
    sigmas.map((a, i) =>
      sigmas.map((b, j) => a * b * (i === j ? 1 : rho * 0.9 ** Math.abs(i - j))),
    );

  // Source: ρᵀV⁻¹ρ from the bins and ml-matrix. Tolerance: sums of 13 squares round to 1e-13; the inverse of V to its condition, 1e3.
  it.each([1, 1.25])('is that of the stops below the cap, depth scale %f', (scale) => {
    const hand = byHand(scale, shared(0));
    information(scale, null).forEach((value, k) => expect(value).toBeCloseTo(hand[k]!, 9));
  });

  it('counts errors that points share', () => {
    const hand = byHand(1, shared(0.6));
    information(1, shared(0.6)).forEach((value, k) => expect(value).toBeCloseTo(hand[k]!, 9));
    const alone = byHand(1, shared(0));
    expect(Math.max(...hand.map((value, k) => Math.abs(value - alone[k]!)))).toBeGreaterThan(0.05);
  });
});

describe('the depths of a picture', () => {
  // Source: the docstring: finer over the edge and its uncertainty. 90 steps lie on each side of it.
  it('are finer over three standard deviations of an edge that is poorly known', () => {
    const { prepared, answer } = fitted(fractionInput({ profile: 'sharp' }, 0.03), {
      edgeDepthNm: 75,
      levelTop: 0.74,
      levelBulk: 0.32,
    });
    const { value, sigma } = answer.parameters[0]!;
    const depths = defaultDepthGrid(prepared, answer);
    const end = quantileByHand(DEEPEST, 0.99);
    expect(3 * sigma!).toBeGreaterThan(end / 25);
    const gaps = [...depths].slice(1).map((depth, k) => ({
      from: depths[k]! - value,
      to: depth - value,
      size: depth - depths[k]!,
    }));
    const within = gaps.filter(({ from, to }) => from >= -3 * sigma! && to <= 3 * sigma!);
    expect(Math.max(...within.map(({ size }) => size))).toBeLessThan((1.000001 * 3 * sigma!) / 90);
    const outside = gaps.filter(
      ({ from, to }) => to < -3 * sigma! - end / 200 || from > 3 * sigma! + end / 200,
    );
    outside.forEach(({ size }) => expect(size).toBeCloseTo(end / 200, 9));
    expect(outside.length).toBeGreaterThan(50);
    expect(Math.min(...depths.map((depth) => Math.abs(depth - value)))).toBeLessThan(1e-9);
  });
});

describe('a rate too small to be seen', () => {
  // Source: a relaxation below about 0.02 µs⁻¹ leaves the signal undamped in a 10 µs window, and in germanium near 200 K about
  // 1 µs⁻¹ is 10¹² cm⁻³ (common practice, no source). So points that tell 0.02 µs⁻¹ apart cannot show less than 2·10¹⁰ cm⁻³, and
  // nearly that where all muons of one energy stop in front of the edge. Tolerance: 1 % of them stop behind it.
  it('sets the floor of the carriers where the signal is undamped', () => {
    const values = { edgeDepthNm: 75, edgeWidthNm: 4, levelTop: 0.02, levelBulk: 4 };
    const template = rateInput(
      {
        response: {
          kind: 'capture-rate',
          gammaCm3PerS: 1e-6,
          gammaSigmaCm3PerS: null,
          baselinePerUs: 0,
        },
      },
      0.02,
    );
    const prepared = prepareFit({
      ...template,
      points: simulateScan({ input: template, values, seed: 1 }),
    });
    const { floor } = carrierProfile(prepared, answerOf(fit(prepared)));
    expect(floor!).toBeGreaterThanOrEqual(2e10);
    expect(floor!).toBeLessThan(1.01 * 2e10);
  });
});
