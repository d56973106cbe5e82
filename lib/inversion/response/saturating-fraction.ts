import { InversionError } from '../errors';
import { foldSeenShare } from '../fold/fold-seen-share';
import type { TrialProfile } from '../profile/trial-profile';
import type { FitInput, Response } from '../types';
import type { ConcentrationLine, ResponseModel } from './response-model';

type Input = Pick<FitInput, 'response' | 'carriers' | 'polarity'>;

function halfPerCm3({ response }: { response: Response }): number {
  if (response.kind === 'saturating-fraction') return response.halfPerCm3;
  throw new InversionError('wrong-response', 'A saturating fraction was expected here.');
}

/** Concentrations at s = 0 and s = 1. */
function concentrations({ carriers, polarity }: Input): ConcentrationLine {
  const { bulkPerCm3, topPerCm3 } = carriers;
  const top = topPerCm3 ?? (polarity === 'depletion' ? 0 : null);
  if (bulkPerCm3 === null || top === null || bulkPerCm3 === top) {
    throw new InversionError(
      'no-bulk-concentration',
      polarity === 'depletion'
        ? 'A saturating fraction needs the carrier concentration of the bulk, and it must differ from that at the surface.'
        : 'A saturating fraction under accumulation needs the carrier concentrations of the bulk and at the surface, and they must differ.',
    );
  }
  return { offset: top, slope: bulkPerCm3 - top };
}

/** Bulk concentration of the parameters where the profile has one, that of the input elsewhere. */
function steepness(trial: TrialProfile, input: FitInput): (shape: ArrayLike<number>) => number {
  const half = halfPerCm3(input);
  const bulkAt = trial.shape.findIndex(({ name }) => name === 'bulkPerCm3');
  if (bulkAt >= 0) return (shape) => shape[bulkAt]! / half;
  const { offset, slope } = concentrations(input);
  return () => slope / (half + offset);
}

/**
 * Saturating fraction: f = F_pop + (F_free − F_pop)/(1 + p/p_half), where p_half converts half of the charged state back. With
 * p = p_top + (p_bulk − p_top)·s this is top + (bulk − top)·g(s), g(s) = s(1 + K)/(1 + K·s), K = (p_bulk − p_top)/(p_half + p_top):
 * top and bulk are the fractions at s = 0 and s = 1, still linear parameters, and only the share that the probe sees is bent.
 * Its edge lies where p crosses p_half, not where the carriers end. Means over bins by five-point Gauss-Legendre quadrature on
 * quarters of the edge width, 1e-10 of the contrast for K up to 1e4; exact for steps.
 */
export const saturatingFraction: ResponseModel = {
  observable: 'fraction',
  levelBounds: () => [0, 1],
  capBounds: [0, 1],
  unit: () => 'cm⁻³',
  seen(trial, input) {
    const bulkAt = trial.shape.findIndex(({ name }) => name === 'bulkPerCm3');
    // Steps are 0 or 1 and g leaves both alone.
    if (trial.kinked) {
      concentrations(input);
      return trial;
    }
    const steepnessOf = steepness(trial, input);
    const bending = {
      steepnessOf,
      byBulk: bulkAt < 0 ? null : { at: bulkAt, slope: 1 / halfPerCm3(input) },
    };
    return {
      ...trial,
      crooked: true,
      fold: (kernel, shape, capNm, scale, out) =>
        foldSeenShare(trial, bending, kernel, shape, capNm, scale, out),
    };
  },
  line: (_levelTop, _levelBulk, input) => concentrations(input),
  valueOfChange(change, contrast, input) {
    const half = halfPerCm3(input);
    const { offset, slope } = concentrations(input);
    const occupied = (p: number): number => p / (p + half);
    const full = Math.abs(contrast / (occupied(offset + slope) - occupied(offset)));
    const poor = Math.min(offset, offset + slope);
    return (change * half * (1 + poor / half) ** 2) / full;
  },
};
