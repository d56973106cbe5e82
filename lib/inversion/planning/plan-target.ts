import { IN_WORDS, sentence } from '../parameter-words';
import type { PreparedFit } from '../fit/prepared-fit';
import type { FitAnswer, Interval, ParameterName } from '../types';
import { SIGMAS_68, SIGMAS_95 } from '../uncertainty/bands';

/** The parameter that a plan wants to know better, at the present fit. */
export interface PlanTarget {
  name: ParameterName;
  value: number;
  /** Its σ by the present covariance. */
  sigma: number;
  /**
   * Present covariance of the free parameters that are not at a bound: priors and the full V of the points are in it. A parameter at
   * its bound counts as known.
   */
  covariance: readonly (readonly number[])[];
  /** Place of the target in the covariance. */
  index: number;
  /** Place of each parameter of the covariance among `prepared.parameterNames`. */
  columns: readonly number[];
}

export type TargetOutcome = { ok: true; target: PlanTarget } | { ok: false; reason: string };

/** @returns a reason where nothing can be planned: a target that is absent, held, at its bound or not determined. */
export function planTarget(
  { parameterNames }: PreparedFit,
  { parameters, covariance }: FitAnswer,
  name: ParameterName,
): TargetOutcome {
  const parameter = parameters.find((candidate) => candidate.name === name);
  const refuse = (reason: string): TargetOutcome => ({ ok: false, reason });
  if (!parameter) return refuse(`This trial profile has no parameter for ${IN_WORDS[name]}.`);
  if (parameter.held)
    return refuse(`${sentence(name)} is held, so no point makes it better known.`);
  if (parameter.atBound !== null)
    return refuse(
      `${sentence(name)} is at its ${parameter.atBound} bound, where its uncertainty is not that of a normal distribution and cannot be predicted.`,
    );
  if (!covariance.ok)
    return refuse(`The present fit has no covariance to plan from: ${covariance.reason}`);
  const index = covariance.names.indexOf(name);
  if (index < 0) return refuse(`The present covariance does not contain ${IN_WORDS[name]}.`);
  const columns = covariance.names.map((free) => parameterNames.indexOf(free));
  return {
    ok: true,
    target: {
      name,
      value: parameter.value,
      sigma: Math.sqrt(covariance.matrix[index]![index]!),
      covariance: covariance.matrix,
      index,
      columns,
    },
  };
}

export interface PredictedIntervals {
  sigma: number;
  interval68: Interval;
  interval95: Interval;
}

/**
 * value ± 1 and ± 1.96 σ: cut where a bound is the natural end of the parameter, open (null) where it is merely the end of the
 * search, as in the intervals of a fit.
 */
export function predictedIntervals(
  { problem: { model } }: PreparedFit,
  { name, value }: PlanTarget,
  sigma: number,
): PredictedIntervals {
  const k = model.names.indexOf(name);
  const end = (at: number, side: 'lower' | 'upper'): number | null => {
    const bound = model[side][k]!;
    if (side === 'lower' ? at > bound : at < bound) return at;
    return (side === 'lower' ? model.closedLower : model.closedUpper)[k] ? bound : null;
  };
  const around = (sigmas: number): Interval => [
    end(value - sigmas * sigma, 'lower'),
    end(value + sigmas * sigma, 'upper'),
  ];
  return { sigma, interval68: around(SIGMAS_68), interval95: around(SIGMAS_95) };
}
