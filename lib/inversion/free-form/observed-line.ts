import { InversionError } from '../errors';
import { saturatingFraction } from '../response/saturating-fraction';
import { twoLevel } from '../response/two-level';
import type { ProfileUnit } from '../types';
import type { FreeFormInput } from './free-form-input';

/** What one muon sees where the unknown is u, base + slope·u, and the profile value that u stands for. */
export interface ObservedLine {
  base: number;
  slope: number;
  unit: ProfileUnit;
  /** Null where u lies above what any concentration gives. */
  valueOf(u: number): number | null;
}

/** 1 µs⁻¹ in s⁻¹. */
const PER_S_IN_PER_US = 1e6;

/**
 * The unknown u of each response, chosen so that the data are linear in it:
 * - capture rate: u = γ·p (µs⁻¹), Λ = u + Λ₀, p = u·10⁶/γ;
 * - two-level: u = populated share π, y = empty + (populated − empty)·π, the empty level being that of the poor side of the edge;
 *   p follows from π as in response/two-level.ts. π may come out above 1: the scan then asks for more than the held level gives;
 * - saturating fraction: u = occupied share h = p/(p + p_half), in which y is linear, through the held levels at the
 *   concentrations p_top and p_bulk; p = p_half·h/(1 − h), and h ≥ 1 is above the ceiling (null).
 *
 * Levels must be held, as the profile takes up whatever a level leaves: base and slope of u are not decided by the data.
 *
 * @throws InversionError 'levels-not-held', 'no-contrast' where they are equal, 'no-bulk-concentration' where p_top or p_bulk is missing.
 */
export function observedLine(input: FreeFormInput): ObservedLine {
  const { response, polarity } = input;
  if (response.kind === 'capture-rate') {
    const perUnit = PER_S_IN_PER_US / response.gammaCm3PerS;
    return { base: response.baselinePerUs, slope: 1, unit: 'cm⁻³', valueOf: (u) => u * perUnit };
  }
  const [top, bulk] = heldLevels(input);
  if (response.kind === 'saturating-fraction')
    return saturatingLine(input, response.halfPerCm3, top, bulk);
  const unit = twoLevel.unit(response, input.carriers, polarity);
  const { offset, slope } = twoLevel.line(top, bulk, input);
  return polarity === 'depletion'
    ? { base: top, slope: bulk - top, unit, valueOf: (u) => offset + slope * u }
    : { base: bulk, slope: top - bulk, unit, valueOf: (u) => offset + slope * (1 - u) };
}

function saturatingLine(
  input: FreeFormInput,
  half: number,
  levelTop: number,
  levelBulk: number,
): ObservedLine {
  const { offset: top, slope: change } = saturatingFraction.line(levelTop, levelBulk, input);
  const occupied = (p: number): number => p / (p + half);
  const slope = (levelBulk - levelTop) / (occupied(top + change) - occupied(top));
  return {
    base: levelTop - slope * occupied(top),
    slope,
    unit: 'cm⁻³',
    valueOf: (u) => (u < 1 ? (half * u) / (1 - u) : null),
  };
}

function heldLevels({ parameters: { levelTop, levelBulk } }: FreeFormInput): [number, number] {
  if (!levelTop?.held || !levelBulk?.held) {
    throw new InversionError(
      'levels-not-held',
      'A free-form profile of a fraction needs both levels held, from bulk reference runs: the profile takes up whatever a free level leaves.',
    );
  }
  if (levelTop.value === levelBulk.value) {
    throw new InversionError(
      'no-contrast',
      'The two levels are equal: a scan between them says nothing of carriers.',
    );
  }
  return [levelTop.value!, levelBulk.value!];
}
