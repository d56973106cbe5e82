import { CholeskyDecomposition, Matrix, inverse, solve } from 'ml-matrix';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  edgeInformationByEnergy,
  fit,
  foldScan,
  prepareFit,
  resample,
  simulateScan,
  valuesOf,
  type FitInput,
} from '@/lib/inversion/index';
import { correlatedWhitener, unwhiten, whiten } from '@/lib/inversion/linalg/whitener';
import { answerOf, fractionInput, uniforms } from './support/scans';

const TRUTH = { edgeDepthNm: 75, edgeWidthNm: 18, levelTop: 0.74, levelBulk: 0.32 };
const SIGMA = 0.006;

/** V of points that share an error: σ²(δ + ρ), and a share that falls with distance. */
function sharedError(count: number, rho: number, fall: number, sigma = SIGMA): number[][] {
  return Array.from({ length: count }, (_, i) =>
    Array.from({ length: count }, (__, j) =>
      i === j ? sigma ** 2 : sigma ** 2 * rho * fall ** Math.abs(i - j),
    ),
  );
}

function correlated(rho: number, fall: number, seed: number): FitInput {
  const template = fractionInput({}, SIGMA);
  const input = { ...template, covariance: sharedError(template.points.length, rho, fall) };
  return { ...input, points: simulateScan({ input, values: TRUTH, seed }) };
}

/** (y − ŷ)ᵀV⁻¹(y − ŷ) over the points in use, straight from its definition. */
function chiSquareOf(input: FitInput, values: Parameters<typeof foldScan>[1]): number {
  const used = input.points.flatMap(({ enabled }, i) => (enabled ? i : []));
  const predicted = foldScan(prepareFit(input), values);
  const r = Matrix.columnVector(used.map((i) => input.points[i]!.value - predicted[i]!));
  const v = new Matrix(used.map((i) => used.map((j) => input.covariance![i]![j]!)));
  return r.transpose().mmul(inverse(v)).mmul(r).get(0, 0);
}

describe('a full covariance of the points', () => {
  it('whitens: W V Wᵀ is one, and unwhitening undoes it', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 12 }), fc.integer({ min: 0, max: 1e6 }), (n, seed) => {
        const random = uniforms(seed);
        const factor = Array.from({ length: n }, (_, i) =>
          Array.from({ length: n }, (__, j) =>
            j > i ? 0 : j === i ? random.between(0.5, 2) : random.between(-1, 1),
          ),
        );
        const v = factor.map((a) => factor.map((b) => a.reduce((s, x, k) => s + x * b[k]!, 0)));
        const enabled = factor.map(() => random.next() < 0.8);
        const whitener = correlatedWhitener(v, enabled);
        const columns = factor.map((_, j) => Float64Array.from(v, (row) => row[j]!));
        columns.forEach((column) => whiten(whitener, column));
        // W V: then W (W V)ᵀ must be the unit matrix over the rows in use.
        const rows = factor.map((_, i) => Float64Array.from(columns, (column) => column[i]!));
        rows.forEach((row, i) => {
          whiten(whitener, row);
          row.forEach((value, j) => expect(value).toBeCloseTo(i === j && enabled[i] ? 1 : 0, 10));
        });
        const noise = Float64Array.from(factor, (_, i) => (enabled[i] ? random.between(-2, 2) : 0));
        const there = Float64Array.from(noise);
        unwhiten(whitener, there);
        whiten(whitener, there);
        there.forEach((value, i) => expect(value).toBeCloseTo(noise[i]!, 10));
      }),
      { numRuns: 60 },
    );
  });

  it('gives the χ² of its definition, and no neighbour is lower', () => {
    const input = correlated(0.7, 0.9, 4);
    const answer = answerOf(fit(prepareFit(input)));
    const values = valuesOf(answer);
    expect(chiSquareOf(input, values) / answer.dataChiSquare).toBeCloseTo(1, 9);
    for (const { name, sigma, value } of answer.parameters) {
      if (sigma === null) continue;
      for (const step of [-0.02, 0.02])
        expect(chiSquareOf(input, { ...values, [name]: value + step * sigma })).toBeGreaterThan(
          answer.chiSquare,
        );
    }
  });

  it('that is diagonal is the fit of independent points, to rounding', () => {
    const plain = fractionInput({}, SIGMA);
    const points = simulateScan({ input: plain, values: TRUTH, seed: 2 });
    const diagonal = sharedError(points.length, 0, 1);
    const one = answerOf(fit(prepareFit({ ...plain, points })));
    const other = answerOf(fit(prepareFit({ ...plain, points, covariance: diagonal })));
    expect(other.chiSquare).toBeCloseTo(one.chiSquare, 9);
    one.parameters.forEach(({ value, sigma }, k) => {
      if (sigma === null) return;
      expect(Math.abs(other.parameters[k]!.value - value) / sigma).toBeLessThan(1e-6);
      expect(other.parameters[k]!.sigma! / sigma).toBeCloseTo(1, 6);
    });
  });

  it('a point switched off leaves the block of the others: the same as a scan without it', () => {
    const input = correlated(0.6, 1, 5);
    const off = { ...input, points: input.points.map((p, i) => ({ ...p, enabled: i !== 4 })) };
    const keep = (_: unknown, i: number): boolean => i !== 4;
    const without = {
      ...input,
      points: input.points.filter(keep),
      covariance: input.covariance!.filter(keep).map((row) => row.filter(keep)),
    };
    const one = answerOf(fit(prepareFit(off)));
    const other = answerOf(fit(prepareFit(without)));
    expect(one.chiSquare).toBeCloseTo(other.chiSquare, 8);
    expect(one.parameters[0]!.value).toBeCloseTo(other.parameters[0]!.value, 5);
  });

  // V = σ²((1 − ρ)·1 + ρ·J): the levels take up what all points share, so that σ of the edge is √(1 − ρ) of that of independent
  // points. Tolerance: the two minima lie a few hundredths of a σ apart.
  it('leaves what all points share to the levels: the edge is known better by √(1 − ρ)', () => {
    const shared = answerOf(fit(prepareFit(correlated(0.9, 1, 6))));
    const plain = answerOf(fit(prepareFit({ ...correlated(0.9, 1, 6), covariance: null })));
    const ratio = shared.parameters[0]!.sigma! / plain.parameters[0]!.sigma!;
    expect(Math.abs(ratio / Math.sqrt(0.1) - 1)).toBeLessThan(0.05);
  });

  // 400 scans: the scatter of the edge against its mean σ is known to 1/√800 = 3.5 %; three of them and a little for curvature.
  it('is the scatter that simulated scans have, and that resampling gives', () => {
    const edges = Array.from({ length: 400 }, (_, seed) => {
      const outcome = fit(prepareFit(correlated(0.7, 0.9, seed)), { intervalsFor: [] });
      return answerOf(outcome).parameters[0]!;
    });
    const mean = edges.reduce((sum, { value }) => sum + value, 0) / edges.length;
    const scatter = Math.sqrt(
      edges.reduce((sum, { value }) => sum + (value - mean) ** 2, 0) / (edges.length - 1),
    );
    const stated = edges.reduce((sum, { sigma }) => sum + sigma!, 0) / edges.length;
    expect(Math.abs(scatter / stated - 1)).toBeLessThan(0.13);
    const prepared = prepareFit(correlated(0.7, 0.9, 1));
    const answer = answerOf(fit(prepared));
    const rows = resample(prepared, answer, { seed: 3, first: 0, count: 400 });
    const drawn = Array.from({ length: 400 }, (_, r) => rows[r * prepared.freeNames.length]!);
    const centre = drawn.reduce((sum, value) => sum + value, 0) / 400;
    const spread = Math.sqrt(drawn.reduce((sum, value) => sum + (value - centre) ** 2, 0) / 399);
    expect(Math.abs(spread / answer.parameters[0]!.sigma! - 1)).toBeLessThan(0.13);
  });

  // Source: the definition by hand. Slopes of ŷ by central differences, whitened by the Cholesky factor of V, the edge less what the other
  // parameters explain by least squares, squared. Tolerance 1e-6: differences of 1e-3 of a σ are good to that, rounding to 1e-9.
  it('counts in what each energy tells of the edge', () => {
    const input = correlated(0.7, 0.9, 1);
    const prepared = prepareFit(input);
    const answer = answerOf(fit(prepared));
    const values = valuesOf(answer);
    const slopes = answer.parameters
      .filter(({ held }) => !held)
      .map(({ name, value, sigma }) => {
        const at = (move: number): Float64Array =>
          foldScan(prepared, { ...values, [name]: value + move * sigma! });
        const above = at(1e-3);
        return [...at(-1e-3)].map((below, i) => (above[i]! - below) / 2e-3);
      });
    const sharesBy = (factor: Matrix): number[] => {
      const [edge, ...others] = slopes.map((slope) => solve(factor, Matrix.columnVector(slope)));
      const design = new Matrix(others.map((column) => column.to1DArray())).transpose();
      const rest = Matrix.sub(edge!, design.mmul(solve(design, edge!, true))).to1DArray();
      const total = rest.reduce((sum, value) => sum + value * value, 0);
      return rest.map((value) => (value * value) / total);
    };
    const factorOf = (v: readonly (readonly number[])[]): Matrix =>
      new CholeskyDecomposition(new Matrix(v.map((row) => [...row]))).lowerTriangularMatrix;
    const hand = sharesBy(factorOf(input.covariance!));
    const shares = edgeInformationByEnergy(prepared, answer);
    shares.forEach((share, i) => expect(share, `point ${i}`).toBeCloseTo(hand[i]!, 6));
    // It matters here: points that share nothing would tell something else.
    const apart = sharesBy(factorOf(sharedError(hand.length, 0, 1)));
    expect(Math.max(...hand.map((share, i) => Math.abs(share - apart[i]!)))).toBeGreaterThan(0.05);
    // Whatever the order of the scan.
    const turned = prepareFit({
      ...input,
      points: [...input.points].reverse(),
      covariance: [...input.covariance!].reverse().map((row) => [...row].reverse()),
    });
    const back = edgeInformationByEnergy(turned, answer).reverse();
    back.forEach((share, i) => expect(share, `point ${i}`).toBeCloseTo(shares[i]!, 9));
  });

  it('refuses what is no covariance, saying what is wrong', () => {
    const input = correlated(0.5, 1, 1);
    const n = input.points.length;
    const change = (edit: (v: number[][]) => void): FitInput => {
      const covariance = sharedError(n, 0.5, 1);
      edit(covariance);
      return { ...input, covariance };
    };
    const refused = (bad: FitInput, words: RegExp): void => {
      expect(() => prepareFit(bad)).toThrow(
        expect.objectContaining({ code: 'bad-covariance', message: expect.stringMatching(words) }),
      );
    };
    refused(
      change((v) => v.pop()),
      /needs 13 rows of 13/,
    );
    refused(
      change((v) => v[3]!.pop()),
      /needs 13 rows of 13/,
    );
    refused(
      change((v) => (v[3]![5] = NaN)),
      /points 4 and 6|points 6 and 4/,
    );
    refused(
      change((v) => (v[3]![5] = 2 * v[3]![5]!)),
      /one way and .* the other/,
    );
    refused(
      change((v) => (v[3]![3] = 4 * v[3]![3]!)),
      /Point 4 .*variance/,
    );
    refused(
      change((v) =>
        v.forEach((row, i) => row.forEach((_, j) => (row[j] = SIGMA ** 2 * (i === j ? 1 : 1)))),
      ),
      /not positive definite/,
    );
  });
});
