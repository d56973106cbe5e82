import { InversionError } from '../errors';
import type { PreparedFit } from '../fit/prepared-fit';
import type { FitAnswer, ParameterName } from '../types';
import { sigmaAfter } from './best-next-energy';
import { designState, optimalDesign, whitenDesign, type DesignProblem } from './c-optimal';
import { candidatesOf, type Candidate, type CandidateInput } from './candidates';
import { checkHours } from './one-hour-sigma';
import {
  planTarget,
  predictedIntervals,
  type PlanTarget,
  type PredictedIntervals,
} from './plan-target';
import { repeatScan } from './repeat-scan';
import { wholeSteps } from './whole-steps';

export interface SplitInput extends CandidateInput {
  target: ParameterName;
  /** All hours to be given out. */
  hours: number;
  /** Smallest unit of time at one energy, when the split is wanted in whole steps too. */
  stepHours?: number;
}

export interface EnergyHours {
  energyKeV: number;
  hours: number;
}

export interface Plan extends PredictedIntervals {
  /** Energies that get time, ascending. */
  split: readonly EnergyHours[];
}

export interface OptimalPlan extends Plan {
  /**
   * The certificate: no split of these hours over the allowed energies has a σ below this one. √(variance − gap), with the gap of
   * the equivalence theorem.
   */
  lowestSigma: number;
  /** The gap as a share of the variance. */
  relativeGap: number;
  exchanges: number;
}

export type SplitOutcome =
  | {
      ok: true;
      target: ParameterName;
      value: number;
      present: PredictedIntervals;
      best: OptimalPlan;
      /** In whole steps; null when not asked for. Hours that make no whole step are not given out. */
      wholeSteps: Plan | null;
      /** All hours at the single best energy. */
      single: Plan;
      /** The same scan again for as many hours, divided as it was. */
      repeat: Plan;
    }
  | { ok: false; reason: string };

/** Time below this share of all hours is left over from the search and is not shown. */
const NEGLIGIBLE = 1e-6;

/**
 * How H hours are best divided over the allowed energies to know one parameter: the c-optimal split (`optimalDesign`; G. Elfving,
 * Ann. Math. Stat. 23, 255, 1952), minimising cᵀ(M₀ + Σ t_k g_k g_kᵀ/σ₁_k²)⁻¹c with the present information M₀ (priors and V in
 * it) and g = ∂ŷ/∂θ; next to it all hours at the single best energy, and the same scan again.
 *
 * The prediction is linear about the present fit: it says how well the parameter would be known if its value is what the fit
 * found. Where the fit itself is poor, so is the plan.
 *
 * @returns a reason where the target is absent, held, at its bound or not determined.
 * @throws InversionError for hours, steps, energies or σ₁ that cannot be.
 */
export function bestSplit(
  prepared: PreparedFit,
  answer: FitAnswer,
  input: SplitInput,
): SplitOutcome {
  const { hours } = input;
  checkHours(hours);
  const steps = stepsIn(input);
  const outcome = planTarget(prepared, answer, input.target);
  if (!outcome.ok) return outcome;
  const { target } = outcome;
  const candidates = candidatesOf(prepared, answer, target, input);
  const problem = designOf(target, candidates);
  const plan = (split: Float64Array, among: readonly Candidate[], variance: number): Plan => ({
    ...predictedIntervals(prepared, target, Math.sqrt(variance)),
    split: inUse(among, split, hours),
  });
  const optimal = optimalDesign(problem, hours);
  const whole = steps === null ? null : wholeSteps(problem, optimal.hours, input.stepHours!, steps);
  const again = repeatScan(prepared, answer, target, input.oneHourSigma, hours);
  const repeated = designState(whitenDesign(designOf(target, again.candidates)), again.hours);
  return {
    ok: true,
    target: target.name,
    value: target.value,
    present: predictedIntervals(prepared, target, target.sigma),
    best: {
      ...plan(optimal.hours, candidates, optimal.variance),
      lowestSigma: Math.sqrt(Math.max(0, optimal.variance - optimal.gap)),
      relativeGap: optimal.gap / optimal.variance,
      exchanges: optimal.exchanges,
    },
    wholeSteps: whole && plan(whole.hours, candidates, whole.variance),
    single: bestSingle(prepared, target, candidates, hours),
    repeat: plan(again.hours, again.candidates, repeated.variance),
  };
}

function designOf(
  { covariance, index }: PlanTarget,
  candidates: readonly Candidate[],
): DesignProblem {
  return { covariance, index, vectors: candidates.map(({ vector }) => vector) };
}

function inUse(among: readonly Candidate[], split: Float64Array, total: number): EnergyHours[] {
  return among
    .map(({ energyKeV }, k) => ({ energyKeV, hours: split[k]! }))
    .filter(({ hours }) => hours > NEGLIGIBLE * total)
    .sort((a, b) => a.energyKeV - b.energyKeV);
}

function bestSingle(
  prepared: PreparedFit,
  target: PlanTarget,
  candidates: readonly Candidate[],
  hours: number,
): Plan {
  const [best] = candidates
    .map((candidate) => ({ candidate, sigma: sigmaAfter(target, candidate, hours) }))
    .sort((a, b) => a.sigma - b.sigma);
  return {
    ...predictedIntervals(prepared, target, best!.sigma),
    split: [{ energyKeV: best!.candidate.energyKeV, hours }],
  };
}

/** Number of whole steps in the hours; null when none are asked for. */
function stepsIn({ hours, stepHours }: SplitInput): number | null {
  if (stepHours === undefined) return null;
  checkHours(stepHours);
  const steps = Math.floor(hours / stepHours + 1e-9);
  if (steps >= 1 && steps <= MOST_STEPS) return steps;
  throw new InversionError(
    'bad-hours',
    steps < 1
      ? `${hours} hours hold no whole step of ${stepHours} hours.`
      : `${hours} hours hold more than ${MOST_STEPS} steps of ${stepHours} hours.`,
  );
}

const MOST_STEPS = 1_000;
