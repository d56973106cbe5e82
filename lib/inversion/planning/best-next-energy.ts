import type { PreparedFit } from '../fit/prepared-fit';
import type { FitAnswer, ParameterName } from '../types';
import { candidatesOf, type Candidate, type CandidateInput } from './candidates';
import { checkHours } from './one-hour-sigma';
import {
  planTarget,
  predictedIntervals,
  type PlanTarget,
  type PredictedIntervals,
} from './plan-target';

export interface NextEnergyInput extends CandidateInput {
  target: ParameterName;
  /** Counting time of the one new point. */
  hours: number;
}

export interface NextEnergy extends PredictedIntervals {
  energyKeV: number;
}

export type NextEnergyOutcome =
  | {
      ok: true;
      target: ParameterName;
      value: number;
      present: PredictedIntervals;
      /** What every allowed energy would leave, in the order given. */
      candidates: readonly NextEnergy[];
      best: NextEnergy;
    }
  | { ok: false; reason: string };

/**
 * The σ of a parameter that t more hours at one energy would leave, for every allowed energy, and the best of them. With the
 * present covariance C = M₀⁻¹ and a = (∂ŷ/∂θ)/σ₁ the information becomes M₀ + t·a·aᵀ, so that
 * σ² = C_kk − t·(C·a)_k²/(1 + t·aᵀCa) (Sherman and Morrison).
 *
 * The prediction is linear about the present fit: it says how well the parameter would be known if its value is what the fit
 * found. Where the fit itself is poor, so is the plan.
 *
 * @returns a reason where the target is absent, held, at its bound or not determined.
 * @throws InversionError for hours, energies or σ₁ that cannot be.
 */
export function bestNextEnergy(
  prepared: PreparedFit,
  answer: FitAnswer,
  input: NextEnergyInput,
): NextEnergyOutcome {
  checkHours(input.hours);
  const outcome = planTarget(prepared, answer, input.target);
  if (!outcome.ok) return outcome;
  const { target } = outcome;
  const candidates = candidatesOf(prepared, answer, target, input).map((candidate) => ({
    energyKeV: candidate.energyKeV,
    ...predictedIntervals(prepared, target, sigmaAfter(target, candidate, input.hours)),
  }));
  return {
    ok: true,
    target: target.name,
    value: target.value,
    present: predictedIntervals(prepared, target, target.sigma),
    candidates,
    best: candidates.reduce((a, b) => (b.sigma < a.sigma ? b : a)),
  };
}

/** σ of the target after t hours at one energy. */
export function sigmaAfter(
  { covariance, index }: PlanTarget,
  { vector }: Pick<Candidate, 'vector'>,
  hours: number,
): number {
  const turned = covariance.map((row) => row.reduce((sum, c, l) => sum + c * vector[l]!, 0));
  const spread = turned.reduce((sum, value, l) => sum + value * vector[l]!, 0);
  const gain = (hours * turned[index]! ** 2) / (1 + hours * spread);
  return Math.sqrt(Math.max(0, covariance[index]![index]! - gain));
}
