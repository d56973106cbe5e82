import { InversionError } from '../errors';
import type { FitAnswer, ParameterValues } from '../types';
import type { PreparedFit } from './prepared-fit';

/**
 * Values by name as the parameter vector of a fit; a depth scale left out is the held or prior one, a width left out is 0.
 *
 * @throws InversionError for a missing or non-finite value, a negative width, or a depth scale ≤ 0.
 */
export function thetaOf({ problem }: PreparedFit, values: ParameterValues): Float64Array {
  const { model } = problem;
  return Float64Array.from(model.names, (name, k) => {
    const value =
      values[name] ?? (name === 'depthScale' || model.held[k] ? model.neutral[k] : undefined);
    if (value === undefined || !Number.isFinite(value)) {
      throw new InversionError(
        'no-value',
        `A finite value of ${name} is needed, not ${value ?? 'none'}.`,
        { name },
      );
    }
    if (
      (name === 'edgeWidthNm' && value < 0) ||
      (name === 'edgeDepthNm' && value < 0) ||
      (name === 'depthScale' && value <= 0)
    ) {
      throw new InversionError('bad-value', `${name} cannot be ${value}.`, { name });
    }
    return value;
  });
}

export function valuesOf({ parameters }: Pick<FitAnswer, 'parameters'>): ParameterValues {
  return Object.fromEntries(parameters.map(({ name, value }) => [name, value]));
}
