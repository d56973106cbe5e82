import { BOLTZMANN_EV_PER_K } from '../electrostatics/constants';
import { TAIL_BELOW } from '../electrostatics/potential-table';
import { reducedCurve, type ReducedCurve } from '../electrostatics/reduced-curve';
import { spaceChargeFunction } from '../electrostatics/space-charge';
import { foldCumulative } from '../fold/fold-cumulative';
import type { CumulativeScratch } from '../fold/share-fold';
import type { FitInput } from '../types';
import {
  BULK_FACTOR,
  bulkOf,
  debyeOf,
  fermiOf,
  givenBulk,
  largestBulkOf,
  largestDepletion,
  spreadOf,
} from './bent-bulk';
import type { TrialProfile } from './trial-profile';

/** An accumulated surface beyond this, 20,000 times the bulk, is degenerate and Boltzmann statistics end. */
const LARGEST_ACCUMULATION = 10;
const NODES = 48;
const BULK_STEPS = [-2, -1, 0, 1, 2];
/** ∂/∂N by central differences of the exact fold: step² of the third derivative, 1e-8 of the value. */
const RELATIVE_STEP = 1e-4;
/** The curve is this fine for five-point quadrature of a function of e^(−v) to 1e-9 up to v = 100. */
const STEPS_PER_DEBYE_LENGTH = 16;

/** The curve of one bulk from the largest band bending down: every smaller one is the same curve, shifted in depth. */
interface BulkCurve {
  bulkPerCm3: number;
  lengthNm: number;
  fermi: number;
  curve: ReducedCurve;
  /** The surface asked for last and the depth on the curve where it lies: a fold asks thousands of times for one. */
  surface: number;
  origin: number;
}

/**
 * Band bending: s(x) = e^(−φ(x)/kT), the majority carriers over those of the bulk, φ from Poisson's equation with both carriers
 * (electrostatics/reduced-curve.ts), φ(0) = φ_s. Parameters φ_s (eV; > 0 depletes, < 0 accumulates, by the polarity) and N, which
 * is held at the bulk concentration unless the settings free it. M(x) = L_D·(A(ξ₀ + x/L_D) − A(ξ₀)) with A = ∫e^(−v)dξ along the
 * common curve and ξ₀ where v = φ_s/kT, so ∂M/∂φ_s = L_D·(s(x) − s(0))·ξ₀′/kT is exact. Means over bins are good to 1e-8.
 *
 * @throws InversionError without a semiconductor or a bulk concentration.
 */
export function bandBending(deepestNm: number, input: FitInput): TrialProfile {
  const bulk = bulkOf(input);
  const given = givenBulk(input);
  const sign = input.polarity === 'depletion' ? 1 : -1;
  const kT = BOLTZMANN_EV_PER_K * bulk.temperatureK;
  const largestBulk = largestBulkOf(input, given);
  const largest =
    sign > 0
      ? largestDepletion(deepestNm / debyeOf(largestBulk, bulk), input, largestBulk, bulk)
      : LARGEST_ACCUMULATION;
  const curves: BulkCurve[] = [];
  const curveOf = (bulkPerCm3: number): BulkCurve =>
    curves.find((known) => known.bulkPerCm3 === bulkPerCm3) ?? addCurve(bulkPerCm3);
  const addCurve = (bulkPerCm3: number): BulkCurve => {
    const fermi = fermiOf(bulkPerCm3, bulk);
    const made = {
      bulkPerCm3,
      lengthNm: debyeOf(bulkPerCm3, bulk),
      fermi,
      curve: reducedCurve(sign * largest, fermi),
      surface: NaN,
      origin: NaN,
    };
    if (curves.length === 3) curves.shift();
    curves.push(made);
    return made;
  };
  const setting = input.parameters.bulkPerCm3;
  const bulkFree = setting !== undefined && !setting.held;
  const bound = sign * largest * kT;
  return {
    kind: 'band-bending',
    shape: [
      {
        name: 'surfacePotentialEv',
        lower: Math.min(0, bound),
        upper: Math.max(0, bound),
        closed: [sign > 0, sign < 0],
        given: null,
      },
      {
        name: 'bulkPerCm3',
        lower: given / BULK_FACTOR,
        upper: given * BULK_FACTOR,
        closed: [false, false],
        given,
      },
    ],
    edges: [],
    crooked: false,
    kinked: false,
    share: (depthNm, shape) => Math.exp(-potentialOf(curveOf(shape[1]!), shape[0]! / kT, depthNm)),
    slopes(depthNm, shape, slopes) {
      const at = (bulkPerCm3: number): number =>
        Math.exp(-potentialOf(curveOf(bulkPerCm3), shape[0]! / kT, depthNm));
      const here = curveOf(shape[1]!);
      const v = potentialOf(here, shape[0]! / kT, depthNm);
      slopes[0] = Math.exp(-v);
      slopes[1] = (-slopes[0] * slopeRatio(here, v, shape[0]! / kT, depthNm)) / kT;
      const step = RELATIVE_STEP * shape[1]!;
      slopes[2] = bulkFree ? (at(shape[1]! + step) - at(shape[1]! - step)) / (2 * step) : 0;
    },
    stretches(shape) {
      const { lengthNm } = curveOf(shape[1]!);
      const v = Math.abs(shape[0]! / kT);
      const toNm = lengthNm * (Math.sqrt(2 * v) + Math.log(1 + v) + 25);
      return [{ fromNm: 0, toNm, stepNm: lengthNm / STEPS_PER_DEBYE_LENGTH }];
    },
    landmarks(shape) {
      const here = curveOf(shape[1]!);
      const surface = shape[0]! / kT;
      const half = sign * Math.LN2;
      const inside = Math.abs(surface) > Math.LN2;
      const depthNm = inside
        ? here.lengthNm * (here.curve.depthOf(half) - here.curve.depthOf(surface))
        : 0;
      return [{ depthNm, widthNm: here.lengthNm }];
    },
    searchAxes: () => [
      Float64Array.from({ length: NODES }, (_, k) => bound * (k / (NODES - 1)) ** 2).sort(),
      Float64Array.from(BULK_STEPS, (k) => given * spreadOf(input) ** k),
    ],
    starts: 3,
    fold(kernel, shape, capNm, scale, out) {
      foldCumulative(kernel, capNm, scale, out, (scratch, first, count, derivatives) => {
        const surface = shape[0]! / kT;
        const intoBulk = scratch.byShape[1]!;
        intoBulk.fill(0, first, count);
        if (derivatives && bulkFree) {
          const step = RELATIVE_STEP * shape[1]!;
          cumulate(curveOf(shape[1]! - step), surface, kT, scratch, first, count, false);
          for (let j = first; j < count; j++) intoBulk[j] = scratch.integral[j]!;
          cumulate(curveOf(shape[1]! + step), surface, kT, scratch, first, count, false);
          for (let j = first; j < count; j++)
            intoBulk[j] = (scratch.integral[j]! - intoBulk[j]!) / (2 * step);
        }
        cumulate(curveOf(shape[1]!), surface, kT, scratch, first, count, derivatives);
      });
    },
  };
}

/** v at a depth below a surface with v_s; where that is next to nothing the curve is a plain exponential. */
function potentialOf(bulk: BulkCurve, surface: number, depthNm: number): number {
  const depth = depthNm / bulk.lengthNm;
  if (Math.abs(surface) <= TAIL_BELOW) return surface * Math.exp(-decayOf(bulk.fermi) * depth);
  return bulk.curve.potential(originOf(bulk, surface) + depth);
}

function originOf(bulk: BulkCurve, surface: number): number {
  if (bulk.surface !== surface) {
    bulk.surface = surface;
    bulk.origin = bulk.curve.depthOf(surface);
  }
  return bulk.origin;
}

function decayOf(fermi: number): number {
  return Math.sqrt(1 + Math.exp(-2 * fermi));
}

/** ∂v(x)/∂v_s = v′(x)/v′(0). */
function slopeRatio(
  { lengthNm, fermi }: BulkCurve,
  v: number,
  surface: number,
  depthNm: number,
): number {
  if (Math.abs(surface) <= TAIL_BELOW) return Math.exp((-decayOf(fermi) * depthNm) / lengthNm);
  return spaceChargeFunction(v, fermi) / spaceChargeFunction(surface, fermi);
}

function cumulate(
  { lengthNm, fermi, curve }: BulkCurve,
  surface: number,
  kT: number,
  { depthsNm, integral, share, byShape }: CumulativeScratch,
  first: number,
  count: number,
  derivatives: boolean,
): void {
  const decay = decayOf(fermi);
  const flat = Math.abs(surface) <= TAIL_BELOW;
  const origin = flat ? 0 : curve.depthOf(surface);
  const shareBefore = flat ? 0 : curve.share(origin);
  const atSurface = Math.exp(-surface);
  // dξ₀/dv_s = 1/v′(0), v′ = −sign(v)·√2 F.
  const shift = flat ? 0 : -Math.sign(surface) / (Math.SQRT2 * spaceChargeFunction(surface, fermi));
  for (let j = first; j < count; j++) {
    const depth = depthsNm[j]! / lengthNm;
    const faded = flat ? -Math.expm1(-decay * depth) / decay : 0;
    integral[j] =
      lengthNm * (flat ? depth - surface * faded : curve.share(origin + depth) - shareBefore);
    if (!derivatives) continue;
    const here = flat ? 1 : Math.exp(-curve.potential(origin + depth));
    share[j] = here;
    byShape[0]![j] = (lengthNm * (flat ? -faded : (here - atSurface) * shift)) / kT;
  }
}
