import erfc from '@stdlib/math-base-special-erfc';
import { InversionError } from '../errors';
import { compileInput, prepareFit } from '../fit/prepare-fit';
import type { PreparedFit } from '../fit/prepared-fit';
import { createRefit, expectedRows, observe, refit } from '../fit/refit';
import { thetaOf, valuesOf } from '../fit/theta-of';
import type { FitAnswer, FitInput, ParameterValues, ProfileKind } from '../types';

/** 95 % point of ½χ²₀ + ½χ²₁: half the tail of χ²₁ above it is 0.05. Its root is the 95 % point of the normal distribution. */
export const CRITICAL_STATISTIC = 2.705543454095404;
/** 80 % point of the normal distribution. */
const DEVIATE_80 = 0.8416212335729143;
/** √T_A at which the power is 80 %. */
const NEEDED = Math.sqrt(CRITICAL_STATISTIC) + DEVIATE_80;
/** Widths looked at before the crossing is bracketed, evenly spaced over the range. */
const STEPS = 32;
/** The width is found to this share of the range. */
const PRECISION = 1e-5;

export interface WidthPower {
  widthNm: number;
  /** √T_A: standard deviations by which a scan of an edge of this width asks for a width. */
  sigmas: number;
  /** Probability that such a scan rejects the sharp edge with 95 % confidence. */
  power: number;
}

export interface SmallestWidth {
  /** The smallest width that is told from a sharp edge with 95 % confidence in 80 % of such scans; null where none is. */
  widthNm: number | null;
  /** A sentence where there is none. */
  reason: string | null;
  /** Widths looked at: 0 to the depth of the last stop. */
  rangeNm: readonly [number, number];
  /** Power over the widths, for drawing. */
  powers: readonly WidthPower[];
}

/**
 * What could have been seen: the smallest edge width that a scan with these energies, uncertainties, priors, levels and edge
 * depth tells from a sharp edge with 95 % confidence and 80 % power.
 *
 * For each width w the sharp edge is fitted to the noise-free scan of a graded one: T_A(w) = min χ²_sharp, the noncentrality of
 * the likelihood ratio (Asimov data; G. Cowan, K. Cranmer, E. Gross and O. Vitells, Eur. Phys. J. C 71, 1554, 2011). The test
 * rejects at T > 2.706, half the tail of χ²₁ (Self and Liang, J. Am. Stat. Assoc. 82, 605, 1987), so the power is
 * Φ(√T_A − √2.706), and 80 % is reached at √T_A = 1.645 + 0.842. T_A grows like w⁴ at small widths: a width adds in squares to
 * the straggling. Widths far beyond the stops are no edge any more and are told less well again: `powers` shows it.
 *
 * @param answer a sharp or a graded fit; its own width is not used. A prior on the width is left out.
 * @throws InversionError 'wrong-fit' for another trial profile.
 */
export function smallestWidthFromSharp(prepared: PreparedFit, answer: FitAnswer): SmallestWidth {
  const statistic = noiseFreeStatistic(prepared, valuesOf(answer));
  const longest = prepared.deepestNm;
  const at = (widthNm: number): WidthPower => {
    const sigmas = Math.sqrt(statistic(widthNm));
    const power = 0.5 * erfc((Math.sqrt(CRITICAL_STATISTIC) - sigmas) / Math.SQRT2);
    return { widthNm, sigmas, power };
  };
  const powers = Array.from({ length: STEPS + 1 }, (_, k) => at((longest * k) / STEPS));
  const rangeNm = [0, longest] as const;
  const first = powers.findIndex(({ sigmas }) => sigmas >= NEEDED);
  if (first > 0) {
    const widthNm = crossing(at, powers[first - 1]!.widthNm, powers[first]!.widthNm, longest);
    return { widthNm, reason: null, rangeNm, powers };
  }
  const best = powers.reduce((a, b) => (b.power > a.power ? b : a));
  const reason = `No width up to ${longest.toPrecision(3)} nm would be told from a sharp edge with 95 % confidence in 80 % of such scans; at best ${Math.round(100 * best.power)} % of them would tell it, at a width of ${best.widthNm.toPrecision(2)} nm.`;
  return { widthNm: null, reason, rangeNm, powers };
}

/** T_A(w): min Φ of the sharp edge over the noise-free scan of a graded edge of width w, prior means at the truth. */
function noiseFreeStatistic(
  { input }: PreparedFit,
  values: ParameterValues,
): (widthNm: number) => number {
  if (input.profile !== 'sharp' && input.profile !== 'graded') {
    throw new InversionError(
      'wrong-fit',
      'The smallest width is asked of a sharp or a graded edge.',
    );
  }
  const graded = compileInput(withProfile(input, 'graded'));
  const sharp = prepareFit(withProfile(input, 'sharp'));
  const again = createRefit(sharp);
  const truth = thetaOf(sharp, values);
  const theta = Float64Array.from(truth);
  return (widthNm) => {
    observe(again, expectedRows(graded, { ...values, edgeWidthNm: widthNm }), truth);
    theta.set(truth);
    return refit(again, theta);
  };
}

function withProfile(input: FitInput, profile: ProfileKind): FitInput {
  const { edgeWidthNm: _, ...parameters } = input.parameters;
  return { ...input, profile, parameters };
}

/** Where √T_A reaches what is needed, by halving. */
function crossing(
  at: (widthNm: number) => WidthPower,
  below: number,
  above: number,
  range: number,
): number {
  let low = below;
  let high = above;
  while (high - low > PRECISION * range) {
    const middle = (low + high) / 2;
    if (at(middle).sigmas >= NEEDED) high = middle;
    else low = middle;
  }
  return high;
}
