import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  createStoppingProfile,
  createStoppingSet,
  foldScan,
  prepareFit,
  type FitInput,
} from '@/lib/inversion/index';
import { fractionInput, free, SHARED_SET } from './support/scans';

const runs = { numRuns: 60, seed: 20260114 };
const share = fc.double({ min: 0, max: 1, noNaN: true });
const depth = fc.double({ min: 0, max: 240, noNaN: true });
const width = fc.oneof(fc.constant(0), fc.double({ min: 0.001, max: 80, noNaN: true }));
const scale = fc.double({ min: 0.8, max: 1.2, noNaN: true });
const cap = fc.oneof(fc.constant(0), fc.double({ min: 0.5, max: 30, noNaN: true }));

const prepared = new Map<number, ReturnType<typeof prepareFit>>();
function preparedWith(capThicknessNm: number): ReturnType<typeof prepareFit> {
  const known =
    prepared.get(capThicknessNm) ??
    prepareFit(fractionInput({ capThicknessNm, parameters: { depthScale: free } }));
  prepared.set(capThicknessNm, known);
  return known;
}

describe('a fold', () => {
  // Source: ŷ = top·(1 − q − S) + bulk·S + cap·q by its definition.
  it('is linear in the levels', () => {
    fc.assert(
      fc.property(
        depth,
        width,
        scale,
        cap,
        share,
        share,
        share,
        (edgeDepthNm, edgeWidthNm, depthScale, capNm, top, bulk, levelCap) => {
          const at = (levelTop: number, levelBulk: number, capLevel: number): Float64Array =>
            foldScan(preparedWith(capNm), {
              edgeDepthNm,
              edgeWidthNm,
              depthScale,
              levelTop,
              levelBulk,
              levelCap: capLevel,
            });
          const [whole, a, b, c] = [at(top, bulk, levelCap), at(1, 0, 0), at(0, 1, 0), at(0, 0, 1)];
          for (let i = 0; i < whole.length; i++) {
            expect(whole[i]).toBeCloseTo(
              top * a[i]! + bulk * b[i]! + levelCap * (capNm > 0 ? c[i]! : 0),
              12,
            );
            // All levels 1: every stopped muon is counted once.
            expect(a[i]! + b[i]! + (capNm > 0 ? c[i]! : 0)).toBeCloseTo(1, 12);
          }
        },
      ),
      runs,
    );
  });

  it('moves one way when the edge moves', () => {
    fc.assert(
      fc.property(
        depth,
        fc.double({ min: 0.01, max: 40, noNaN: true }),
        width,
        cap,
        (edgeDepthNm, step, edgeWidthNm, capNm) => {
          const at = (edge: number): Float64Array =>
            foldScan(preparedWith(capNm), {
              edgeDepthNm: edge,
              edgeWidthNm,
              levelTop: 0,
              levelBulk: 1,
              levelCap: 0,
            });
          const [before, after] = [at(edgeDepthNm), at(edgeDepthNm + step)];
          for (let i = 0; i < before.length; i++)
            expect(after[i]!).toBeLessThanOrEqual(before[i]! + 1e-14);
        },
      ),
      runs,
    );
  });

  // Source: a uniform bin cut in two with its mass in proportion is the same density.
  it('does not change when a bin is split', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.01, max: 1, noNaN: true }), { minLength: 3, maxLength: 12 }),
        fc.nat(),
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        fc.double({ min: 0, max: 60, noNaN: true }),
        width,
        (mass, which, where, edgeDepthNm, edgeWidthNm) => {
          const edges = [0, ...mass.map((_, b) => 7 * (b + 1) + b * 0.3)];
          const b = which % mass.length;
          const cut = edges[b]! + where * (edges[b + 1]! - edges[b]!);
          const splitEdges = [...edges.slice(0, b + 1), cut, ...edges.slice(b + 1)];
          const splitMass = [
            ...mass.slice(0, b),
            where * mass[b]!,
            (1 - where) * mass[b]!,
            ...mass.slice(b + 1),
          ];
          const values = { edgeDepthNm, edgeWidthNm, levelTop: 0, levelBulk: 1 };
          const whole = foldScan(preparedOn(edges, mass), values)[0]!;
          const split = foldScan(preparedOn(splitEdges, splitMass), values)[0]!;
          expect(split).toBeCloseTo(whole, 12);
        },
      ),
      runs,
    );
  });

  // Source: dimensional analysis; every length times c changes no share.
  it('does not change when all lengths are rescaled', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 10, noNaN: true }),
        fc.double({ min: 0, max: 100, noNaN: true }),
        width,
        (c, edgeDepthNm, edgeWidthNm) => {
          const profile = SHARED_SET.profiles[7]!;
          const values = { levelTop: 0.2, levelBulk: 0.9 };
          const once = foldScan(preparedOn([...profile.edgesNm], [...profile.mass]), {
            ...values,
            edgeDepthNm,
            edgeWidthNm,
          });
          const scaled = foldScan(
            preparedOn(
              [...profile.edgesNm].map((x) => c * x),
              [...profile.mass],
            ),
            { ...values, edgeDepthNm: c * edgeDepthNm, edgeWidthNm: c * edgeWidthNm },
          );
          expect(scaled[0]).toBeCloseTo(once[0]!, 11);
        },
      ),
      runs,
    );
  });

  // Source: x → a·x of the whole set is the same as a file whose depths are written a times as large.
  it('takes a depth scale as a file with stretched depths', () => {
    fc.assert(
      fc.property(
        scale,
        fc.double({ min: 0, max: 100, noNaN: true }),
        width,
        cap,
        (depthScale, edgeDepthNm, edgeWidthNm, capThicknessNm) => {
          const profile = SHARED_SET.profiles[5]!;
          const values = { edgeDepthNm, edgeWidthNm, levelTop: 0.2, levelBulk: 0.9, levelCap: 0.5 };
          const scaled = foldScan(
            preparedOn([...profile.edgesNm], [...profile.mass], capThicknessNm),
            { ...values, depthScale },
          );
          const stretched = foldScan(
            preparedOn(
              [...profile.edgesNm].map((x) => depthScale * x),
              [...profile.mass],
              capThicknessNm,
            ),
            { ...values, depthScale: 1 },
          );
          expect(scaled[0]).toBeCloseTo(stretched[0]!, 11);
        },
      ),
      runs,
    );
  });
});

function preparedOn(
  positionsNm: number[],
  weights: number[],
  capThicknessNm = 0,
): ReturnType<typeof prepareFit> {
  const input: FitInput = fractionInput({
    stopping: createStoppingSet([
      createStoppingProfile({
        energyKeV: 5,
        positionsNm,
        positionsAre: 'edges',
        weights,
        weightsAre: 'counts',
      }),
    ]),
    points: [{ energyKeV: 5, value: 0.5, sigma: 0.1, enabled: true }],
    capThicknessNm,
    parameters: {
      edgeDepthNm: { held: true, value: 0, prior: null },
      edgeWidthNm: { held: true, value: 0, prior: null },
      levelTop: { held: true, value: 0, prior: null },
      levelCap: { held: true, value: 0, prior: null },
    },
  });
  return prepareFit(input);
}
