import { describe, expect, it } from 'vitest';
import {
  createStoppingSet,
  freeFormAt,
  freeFormProfile,
  prepareFreeForm,
  simulateScan,
  solveFreeForm,
  stoppingProfileAt,
  type FreeFormInput,
  type ParameterValues,
} from '@/lib/inversion/index';
import { fractionInput, freeWith, heldAt, rateInput } from '../support/scans';
import { largestDifference } from './support/compare';
import { EDGE, EDGE_LEVELS, freeFraction, freeRate, withValues } from './support/inputs';

describe('what the unknown stands for', () => {
  const template = rateInput({ parameters: {} }, 0.02);
  const rates = (values: ParameterValues): FreeFormInput['points'] =>
    simulateScan({ input: template, values, seed: 9 });

  it('is γ·p for a rate: p = u·10⁶/γ, above Λ₀', () => {
    const prepared = prepareFreeForm(
      freeRate({ points: rates({ ...EDGE, levelTop: 0.1, levelBulk: 1.4 }) }),
    );
    const { unknowns, values, unit } = solveFreeForm(prepared);
    expect(unit).toBe('cm⁻³');
    // 1 µs⁻¹ at γ = 1e-6 cm³/s is 1e12 cm⁻³.
    values.forEach((value, j) => expect(value! / 1e12).toBeCloseTo(unknowns[j]!, 12));
    const surface = freeFormProfile(prepared, { unknowns, unit }, null, {
      depthsNm: [0, 150, 1000],
    });
    expect(surface.points[0]!.value).toBeLessThan(0.3e12);
    // σ of 0.02 µs⁻¹ and an overshoot of some per cent behind a smoothed edge.
    expect(Math.abs(surface.points[1]!.value! / 1.39e12 - 1)).toBeLessThan(0.15);
    expect(surface.points[2]!.value).toBe(values[39]!);
  });

  it('is the populated share of a fraction under either polarity', () => {
    const points = simulateScan({ input: fractionInput({}, 0.005), values: EDGE_LEVELS, seed: 5 });
    const depletion = freeFormAt(prepareFreeForm(freeFraction({ points })), 200);
    const accumulation = freeFormAt(
      prepareFreeForm(freeFraction({ points, polarity: 'accumulation' })),
      200,
    );
    expect(depletion.unit).toBe('populated share');
    // The level of the populated side is the other one: the same scan then has its carriers in front.
    expect(depletion.values[39]!).toBeGreaterThan(0.8);
    expect(accumulation.values[0]!).toBeGreaterThan(0.8);
    expect(accumulation.values[39]!).toBeLessThan(0.2);
    const scaled = freeFormAt(
      prepareFreeForm(
        freeFraction({
          points,
          carriers: { bulkPerCm3: 5e16, bulkSigmaPerCm3: null, topPerCm3: 1e15 },
        }),
      ),
      200,
    );
    expect(scaled.unit).toBe('cm⁻³');
    scaled.values.forEach((value, j) =>
      expect(value! / (1e15 + 4.9e16 * depletion.values[j]!)).toBeCloseTo(1, 12),
    );
  });

  // Source: F = F_pop + (F_free − F_pop)/(1 + p/p_half) with p linear in depth below 60 nm, folded by the midpoint rule on bins
  // of 1 nm split in 20.
  it('is the occupied share of a saturating fraction, turned into p afterwards', () => {
    const half = 3e15;
    const [free, populated] = [0.8, 0.25];
    const level = (p: number): number => populated + (free - populated) / (1 + p / half);
    const truth = (x: number): number => (x < 60 ? 0 : Math.min((x - 60) * 2e14, 1.2e16));
    const carriers = { bulkPerCm3: 1.2e16, bulkSigmaPerCm3: null, topPerCm3: null };
    const input = freeFraction(
      {
        carriers,
        response: { kind: 'saturating-fraction', halfPerCm3: half, halfSigmaPerCm3: null },
        parameters: { levelTop: heldAt(level(0)), levelBulk: heldAt(level(1.2e16)) },
      },
      1e-4,
    );
    const values = input.points.map(({ energyKeV }) => {
      const { edgesNm, mass } = stoppingProfileAt(input.stopping, energyKeV);
      return mass.reduce((sum, m, b) => {
        let mean = 0;
        for (let k = 0; k < 20; k++) {
          mean +=
            level(truth(edgesNm[b]! + ((k + 0.5) / 20) * (edgesNm[b + 1]! - edgesNm[b]!))) / 20;
        }
        return sum + m * mean;
      }, 0);
    });
    const prepared = prepareFreeForm(withValues(input, values));
    const answer = solveFreeForm(prepared);
    const profile = freeFormProfile(prepared, answer, null, { depthsNm: [30, 80, 100, 150] });
    const found = profile.points.map(({ value }) => value!);
    expect(found[0]!).toBeLessThan(1e14);
    // 4, 2 and 7 % were seen, which is the smoothing; h itself stands a factor of 2 and more below p/p_half.
    [80, 100, 150].forEach((depthNm, k) =>
      expect(Math.abs(found[k + 1]! / truth(depthNm) - 1)).toBeLessThan(0.1),
    );
    // u is h = p/(p + p_half), and at or above 1 there is no concentration.
    const { line } = prepared.observation;
    expect(line.base + line.slope * 0.5).toBeCloseTo(level(half), 12);
    expect(line.valueOf(0.5)).toBeCloseTo(half, 0);
    expect(line.valueOf(0)).toBe(0);
    expect(line.valueOf(1)).toBe(null);
    expect(line.valueOf(1.2)).toBe(null);
    const above = freeFormProfile(prepared, {
      unknowns: new Array<number>(40).fill(1.01),
      unit: 'cm⁻³',
    });
    expect(above.points.every(({ value }) => value === null)).toBe(true);
  });

  it('is drawn towards a reference where the penalty is strong', () => {
    const knots = prepareFreeForm(freeRate()).knotsNm;
    const reference = Array.from(knots, (x) => 0.5 + 0.4 * Math.sin(x / 30));
    const input = freeRate({
      points: rates({ ...EDGE, levelTop: 0.1, levelBulk: 1.4 }),
      reference,
    });
    const { unknowns, roughness } = freeFormAt(prepareFreeForm(input), 1e12);
    const shift = unknowns[0]! - reference[0]!;
    unknowns.forEach((u, j) => expect(u - reference[j]!).toBeCloseTo(shift, 5));
    expect(roughness).toBeLessThan(1e-6);
  });
});

describe('the cap level', () => {
  // A prior is one more observation: χ² holds ((level − mean)/σ)² beside the points, and the level lies between the two.
  it('with a prior is one more observation', () => {
    const template = freeRate({ capThicknessNm: 8, difference: 2 });
    const values = template.points.map((_, i) => 0.3 + 0.1 * i);
    const at = (parameters: FreeFormInput['parameters']): ReturnType<typeof freeFormAt> =>
      freeFormAt(prepareFreeForm({ ...withValues(template, values), parameters }), 1e4);
    const free = at({});
    const sigma = 0.5;
    const pulled = at({ levelCap: freeWith(free.levelCap! + 0.2, sigma) });
    const points = pulled.residuals.reduce((sum, { reduced }) => sum + reduced ** 2, 0);
    const prior = (free.levelCap! + 0.2 - pulled.levelCap!) / sigma;
    expect(pulled.chiSquare / (points + prior ** 2)).toBeCloseTo(1, 9);
    expect(pulled.levelCap!).toBeGreaterThan(free.levelCap! + 0.01);
    expect(pulled.levelCap!).toBeLessThan(free.levelCap! + 0.19);
    const narrow = at({ levelCap: freeWith(free.levelCap! + 0.2, 1e-6) });
    const held = at({ levelCap: heldAt(free.levelCap! + 0.2) });
    expect(largestDifference(narrow.unknowns, held.unknowns)).toBeLessThan(1e-6);
  });

  it('is no unknown where no muon stops in the cap', () => {
    const plain = freeRate({ capThicknessNm: 0.5 });
    const shifted = {
      ...plain,
      stopping: createStoppingSet(
        plain.stopping.profiles.map((profile) => ({
          ...profile,
          edgesNm: profile.edgesNm.map((x) => x + 1),
        })),
      ),
    };
    const solution = solveFreeForm(
      prepareFreeForm(
        withValues(
          shifted,
          plain.points.map(() => 1),
        ),
      ),
    );
    expect(solution.levelCap).toBe(null);
    expect(solution.status).toBe('solved');
    expect(freeFormAt(prepareFreeForm(plain), 1).levelCap).not.toBe(null);
  });
});
