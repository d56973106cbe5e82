import { InversionError } from '../errors';
import { IN_WORDS, sentence } from '../parameter-words';
import type { FitAnswer, ParameterName, ParameterValues } from '../types';
import type { PreparedFit } from './prepared-fit';

const LENGTHS: readonly ParameterName[] = [
  'edgeDepthNm',
  'edgeWidthNm',
  'layerThicknessNm',
  'farEdgeWidthNm',
];

/**
 * Values by name as the parameter vector of a fit; a depth scale left out is the held or prior one, a width left out is 0.
 *
 * @throws InversionError for a missing or non-finite value, a negative length, a depth scale ≤ 0, or bands bent beyond their bounds.
 */
export function thetaOf({ problem }: PreparedFit, values: ParameterValues): Float64Array {
  const { model } = problem;
  return Float64Array.from(model.names, (name, k) => {
    const value =
      values[name] ?? (name === 'depthScale' || model.held[k] ? model.neutral[k] : undefined);
    if (value === undefined || !Number.isFinite(value)) {
      throw new InversionError(
        'no-value',
        `A finite value of ${IN_WORDS[name]} is needed, not ${value ?? 'none'}.`,
        { name },
      );
    }
    const bounded = name === 'surfacePotentialEv' || name === 'bulkPerCm3';
    if (
      (LENGTHS.includes(name) && value < 0) ||
      (name === 'depthScale' && value <= 0) ||
      (bounded && !(value >= model.lower[k]! && value <= model.upper[k]!))
    ) {
      throw new InversionError('bad-value', `${sentence(name)} cannot be ${value}.`, { name });
    }
    return value;
  });
}

export function valuesOf({ parameters }: Pick<FitAnswer, 'parameters'>): ParameterValues {
  return Object.fromEntries(parameters.map(({ name, value }) => [name, value]));
}
