import { describe, expect, it } from 'vitest';
import { foldScan, type FitInput, type ParameterName } from '@/lib/inversion/index';
import { fillJacobian, foldAt } from '@/lib/inversion/fit/evaluate';
import { compileInput } from '@/lib/inversion/fit/prepare-fit';
import { thetaOf } from '@/lib/inversion/fit/theta-of';
import { PROFILE_CASES, type ProfileCase } from './support';

/** Gauss-Legendre on [−1, 1] with 3 points (Abramowitz and Stegun, table 25.4); the library uses five, on other panels. */
const NODES = [-0.7745966692414834, 0, 0.7745966692414834];
const WEIGHTS = [5 / 9, 8 / 9, 5 / 9];
const PANELS = 400;

/** What the probe sees of a share, from the definitions of the responses. */
function seenShare({ response, carriers, polarity }: FitInput, share: number): number {
  if (response.kind !== 'saturating-fraction') return share;
  const top = carriers.topPerCm3 ?? (polarity === 'depletion' ? 0 : NaN);
  const occupied = (p: number): number => 1 - 1 / (1 + p / response.halfPerCm3);
  const at = (s: number): number => occupied(top + (carriers.bulkPerCm3! - top) * s);
  return (at(share) - at(0)) / (at(1) - at(0));
}

/** ŷ of every point by brute quadrature of the observable over each bin, cut at the edges of the profile. */
function quadrature({ input, values }: ProfileCase): number[] {
  const prepared = compileInput(input);
  const { trial } = prepared.problem.model;
  const shape = trial.shape.map(({ name }) => values[name]!);
  const cuts = trial.landmarks(shape).map(({ depthNm }) => depthNm);
  const { depthScale = 1, levelTop, levelBulk, levelCap = 0 } = values;
  const cap = input.capThicknessNm;
  const level = (x: number): number =>
    x < 0
      ? levelCap
      : levelTop! + (levelBulk! - levelTop!) * seenShare(input, trial.share(x, shape));
  const mean = (left: number, right: number): number => {
    const inside = [0, ...cuts].filter((x) => x > left && x < right);
    const ends = [left, ...inside.sort((a, b) => a - b), right];
    let sum = 0;
    for (let e = 1; e < ends.length; e++) {
      const half = (ends[e]! - ends[e - 1]!) / PANELS / 2;
      for (let p = 0; p < PANELS; p++) {
        const middle = ends[e - 1]! + (2 * p + 1) * half;
        NODES.forEach((node, g) => (sum += WEIGHTS[g]! * half * level(middle + node * half)));
      }
    }
    return sum / (right - left);
  };
  const edges = input.stopping.profiles[0]!.edgesNm;
  const levels = Array.from({ length: edges.length - 1 }, (_, b) =>
    mean(depthScale * edges[b]! - cap, depthScale * edges[b + 1]! - cap),
  );
  return input.points.map(({ energyKeV }) => {
    const { mass } = input.stopping.profiles.find((profile) => profile.energyKeV === energyKeV)!;
    return mass.reduce((sum, share, b) => sum + share * levels[b]!, 0);
  });
}

describe('the fold of a trial profile', () => {
  // Reference: composite three-point quadrature, 400 panels a bin, good to 1e-13 of a smooth mean. Tolerance: what the docstrings
  // state, 1e-10 for the saturating share, 1e-8 of the largest value for bent bands; the others are exact to rounding.
  it.each(PROFILE_CASES.map((one) => [one.name, one] as const))(
    '%s: agrees with quadrature',
    (_, one) => {
      const expected = quadrature(one);
      const found = foldScan(compileInput(one.input), one.values);
      const size = Math.max(1, ...expected.map(Math.abs));
      const tolerance = one.input.profile === 'band-bending' ? 1e-8 * size : 1e-10;
      expected.forEach((value, i) => expect(Math.abs(found[i]! - value)).toBeLessThan(tolerance));
    },
    30_000,
  );

  // Reference: central differences of the fold itself. Tolerance: 2e-5 of the largest derivative, what differences of a kinked
  // integral give; a sharp edge is differentiated inside a bin.
  it.each(PROFILE_CASES.map((one) => [one.name, one] as const))(
    '%s: has the derivatives it states',
    (_, { input, values }) => {
      const prepared = compileInput(input);
      const { model, work } = prepared.problem;
      const theta = thetaOf(prepared, values);
      foldAt(model, work, theta);
      fillJacobian(prepared.problem, theta);
      const stated = Float64Array.from(work.jacobian);
      model.names.forEach((name: ParameterName, k) => {
        if (
          values[name] === 0 ||
          (name === 'bulkPerCm3' && input.parameters.bulkPerCm3 === undefined)
        )
          return;
        const step = 1e-5 * Math.abs(values[name]!);
        const up = foldScan(prepared, { ...values, [name]: values[name]! + step });
        const down = foldScan(prepared, { ...values, [name]: values[name]! - step });
        const numeric = Array.from(
          model.pointOfRow,
          (point) => (up[point]! - down[point]!) / (2 * step),
        );
        const analytic = numeric.map(
          (_value, i) => stated[k * model.rowCount + i]! / model.whitener.inverseSigma[i]!,
        );
        const largest = Math.max(...numeric.map(Math.abs));
        numeric.forEach((value, i) =>
          expect(Math.abs(analytic[i]! - value), `${name}, row ${i}`).toBeLessThan(2e-5 * largest),
        );
      });
    },
  );
});
