import { IN_WORDS, sentence } from '../parameter-words';
import { InversionError } from '../errors';
import type { PreparedFit } from '../fit/prepared-fit';
import type { FitAnswer, ParameterName } from '../types';
import { differenceOf } from './compare-fits';

export interface FittedModel {
  prepared: PreparedFit;
  answer: FitAnswer;
}

/** Two fits of one scan, the simpler a special case of the richer (a sharp edge is a graded one of width zero). */
export interface NestedFits {
  simpler: FittedModel;
  richer: FittedModel;
}

/**
 * @throws InversionError 'not-nested' where the fits do not explain the same points, or where a parameter of the simpler fit is
 * missing from the richer one, or has less freedom or another prior there.
 */
export function checkNested({ simpler, richer }: NestedFits): void {
  const difference = differenceOf([simpler, richer]);
  if (difference) throw new InversionError('not-nested', difference);
  // W·y: the same values under another covariance are other data.
  const other = richer.prepared.problem.data.target;
  if (!simpler.prepared.problem.data.target.every((value, row) => value === other[row])) {
    throw new InversionError(
      'not-nested',
      'The fits do not use the same covariance of the points, so their χ² cannot be compared.',
    );
  }
  simpler.prepared.parameterNames.forEach((name) => {
    const reason = whyNotNested(simpler.prepared, richer.prepared, name);
    if (reason) throw new InversionError('not-nested', reason, { name });
  });
}

function whyNotNested(
  simpler: PreparedFit,
  richer: PreparedFit,
  name: ParameterName,
): string | null {
  const a = settingOf(simpler, name);
  const b = settingOf(richer, name);
  if (!b)
    return `The richer fit has no parameter for ${IN_WORDS[name]}, so the simpler one is no special case of it.`;
  if (!a!.held && b.held)
    return `${sentence(name)} is held in the richer fit and free in the simpler one.`;
  if (a!.held && b.held && a!.neutral !== b.neutral)
    return `${sentence(name)} is held at different values in the two fits.`;
  if (!a!.held && (a!.weight !== b.weight || a!.mean !== b.mean))
    return `${sentence(name)} has different priors in the two fits.`;
  return null;
}

function settingOf(
  { parameterNames, problem: { model, data } }: PreparedFit,
  name: ParameterName,
): { held: boolean; neutral: number; weight: number; mean: number } | null {
  const k = parameterNames.indexOf(name);
  if (k < 0) return null;
  return {
    held: model.held[k] === 1,
    neutral: model.neutral[k]!,
    weight: model.priorInverseSigma[k]!,
    mean: data.priorMean[k]!,
  };
}
