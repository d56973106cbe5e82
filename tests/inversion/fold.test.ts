import { readFileSync } from 'node:fs';
import erfc from '@stdlib/math-base-special-erfc';
import { describe, expect, it } from 'vitest';
import {
  createStoppingProfile,
  createStoppingSet,
  foldCurve,
  foldScan,
  prepareFit,
  type FitInput,
} from '@/lib/inversion/index';
import { fillJacobian, foldAt } from '@/lib/inversion/fit/evaluate';
import { fractionInput, free, heldAt, uniforms } from './support/scans';

interface FoldCase {
  edgesNm: number[];
  mass: number[];
  edgeDepthNm: number;
  edgeWidthNm: number;
  capThicknessNm: number;
  depthScale: number;
  populatedShare: number;
  capShare: number;
}

/** One histogram of stops, folded with levels 0 and 1: the populated share; with the cap level at 1: the cap share. */
function foldOf(
  c: Omit<FoldCase, 'populatedShare' | 'capShare'>,
  levels: { levelTop: number; levelBulk: number; levelCap: number },
): number {
  const profile = createStoppingProfile({
    energyKeV: 5,
    positionsNm: c.edgesNm,
    positionsAre: 'edges',
    weights: c.mass,
    weightsAre: 'counts',
  });
  const input: FitInput = fractionInput({
    stopping: createStoppingSet([profile]),
    points: [{ energyKeV: 5, value: 0.5, sigma: 0.1, enabled: true }],
    capThicknessNm: c.capThicknessNm,
    parameters: {
      edgeDepthNm: heldAt(1),
      edgeWidthNm: heldAt(1),
      levelTop: heldAt(0),
      levelCap: heldAt(0),
      depthScale: heldAt(c.depthScale),
    },
  });
  return foldScan(prepareFit(input), {
    ...levels,
    edgeDepthNm: c.edgeDepthNm,
    edgeWidthNm: c.edgeWidthNm,
    depthScale: c.depthScale,
  })[0]!;
}

describe('folding an edge through a stopping profile', () => {
  const { cases } = JSON.parse(readFileSync('fixtures/reference/inversion/folds.json', 'utf8')) as {
    cases: FoldCase[];
  };

  // Source: quadrature with mpmath at 30 digits. Tolerance 1e-10 by the product's own promise; sums of 30 bins round to 1e-15.
  it.each(cases.map((c, k) => [k, c] as const))('agrees with quadrature, case %i', (_, c) => {
    expect(
      Math.abs(foldOf(c, { levelTop: 0, levelBulk: 1, levelCap: 0 }) - c.populatedShare),
    ).toBeLessThan(1e-12);
    expect(
      Math.abs(foldOf(c, { levelTop: 0, levelBulk: 0, levelCap: 1 }) - c.capShare),
    ).toBeLessThan(1e-12);
  });

  // Source: convolution of Gaussians, ½ erfc((W − µ)/√(2(σ² + w²))). Bins of width h are uniform inside, which adds h²/12 to the
  // variance; folds at h and h/2 extrapolated to h = 0 leave a term in h⁴, below 1e-10 here.
  it.each([
    [80, 11, 78, 9],
    [80, 11, 95, 0],
    [60, 8, 40, 25],
    [100, 13, 100, 2],
  ])(
    'has the closed form for a Gaussian at %f ± %f nm, edge %f ± %f nm',
    (mean, sigma, edge, width) => {
      const at = (h: number): number => {
        const edgesNm = Array.from({ length: Math.round(240 / h) + 1 }, (_, j) => j * h);
        const mass = edgesNm.slice(1).map((right, b) => {
          const z = (x: number): number => (x - mean) / (Math.SQRT2 * sigma);
          const left = edgesNm[b]!;
          // The difference of whichever tails are small, so that no bin loses digits.
          return left > mean
            ? 0.5 * (erfc(z(left)) - erfc(z(right)))
            : 0.5 * (erfc(-z(right)) - erfc(-z(left)));
        });
        return foldOf(
          {
            edgesNm,
            mass,
            edgeDepthNm: edge,
            edgeWidthNm: width,
            capThicknessNm: 0,
            depthScale: 1,
          },
          { levelTop: 0, levelBulk: 1, levelCap: 0 },
        );
      };
      const exact = 0.5 * erfc((edge - mean) / Math.sqrt(2 * (sigma ** 2 + width ** 2)));
      const h = 0.25;
      expect(Math.abs(at(h) - exact)).toBeLessThan(h ** 2 / (24 * (sigma ** 2 + width ** 2)));
      expect(Math.abs((4 * at(h / 2) - at(h)) / 3 - exact)).toBeLessThan(1e-10);
    },
  );

  // Source: central differences of the fold itself, extrapolated (Richardson), good to a millionth of the largest entry; by the
  // depth scale only to 2e-4 behind a cap, whose border crosses kinks of the histogram within the difference.
  it('has the analytic Jacobian of its fold', () => {
    const random = uniforms(4);
    for (let trial = 0; trial < 20; trial++) {
      const prepared = prepareFit(
        fractionInput({
          capThicknessNm: trial % 2 === 0 ? 0 : 7.3,
          parameters: { depthScale: free },
        }),
      );
      const { problem } = prepared;
      const { model, work } = problem;
      const theta = Float64Array.from(model.names, (name) =>
        name === 'edgeDepthNm'
          ? random.between(5, 150)
          : name === 'edgeWidthNm'
            ? random.between(0.8, 40)
            : name === 'depthScale'
              ? random.between(0.9, 1.1)
              : random.next(),
      );
      const predict = (k: number, shift: number): Float64Array => {
        const moved = Float64Array.from(theta);
        moved[k] = moved[k]! + shift;
        return foldScan(
          prepared,
          Object.fromEntries(model.names.map((name, l) => [name, moved[l]!])),
        );
      };
      foldAt(model, work, theta);
      fillJacobian(problem, theta);
      const jacobian = Float64Array.from(work.jacobian);
      for (let k = 0; k < model.size; k++) {
        const h =
          model.names[k] === 'depthScale'
            ? 1e-3
            : model.names[k]!.startsWith('level')
              ? 1e-2
              : 0.05;
        const [a, b, c, d] = [predict(k, h), predict(k, -h), predict(k, h / 2), predict(k, -h / 2)];
        const analytic = jacobian.subarray(k * model.rowCount, (k + 1) * model.rowCount);
        const largest = Math.max(...analytic.map(Math.abs));
        for (let i = 0; i < model.rowCount; i++) {
          const coarse = (a[i]! - b[i]!) / (2 * h);
          const fine = (c[i]! - d[i]!) / h;
          const numeric = (4 * fine - coarse) / 3 / 0.008;
          expect(Math.abs(analytic[i]! - numeric), `${model.names[k]!}, row ${i}`).toBeLessThan(
            (model.names[k] === 'depthScale' && model.capNm > 0 ? 2e-4 : 1e-6) * largest + 1e-9,
          );
        }
      }
    }
  });

  it('gives the same at an energy of the scan as on a curve', () => {
    const prepared = prepareFit(fractionInput());
    const values = { edgeDepthNm: 70, edgeWidthNm: 9, levelTop: 0.7, levelBulk: 0.3 };
    const curve = foldCurve(prepared, values, [4, 7.5, 22]);
    const scan = foldScan(prepared, values);
    expect(curve[0]).toBeCloseTo(scan[2]!, 14);
    expect(curve[2]).toBeCloseTo(scan[12]!, 14);
    expect(curve[1]).toBeLessThan(scan[4]!);
    expect(curve[1]).toBeGreaterThan(scan[5]!);
  });
});
