import type { PreparedFit } from '../fit/prepared-fit';
import type { FitAnswer } from '../types';
import { candidatesOf, type Candidate } from './candidates';
import type { OneHourSigma } from './one-hour-sigma';
import type { PlanTarget } from './plan-target';

export interface RepeatedScan {
  candidates: Candidate[];
  /** Hours at each of them. */
  hours: Float64Array;
}

/**
 * The same scan once more: its points in use, with the hours divided as the scan divided them, t_i ∝ (σ₁(E_i)/σ_i)², the time
 * that its σ_i took at the stated σ₁. The new points are independent of the old ones and of each other.
 */
export function repeatScan(
  prepared: PreparedFit,
  answer: FitAnswer,
  target: PlanTarget,
  oneHourSigma: OneHourSigma,
  hours: number,
): RepeatedScan {
  const points = prepared.input.points.filter(({ enabled }) => enabled);
  const energiesKeV = points.map(({ energyKeV }) => energyKeV);
  const candidates = candidatesOf(prepared, answer, target, { energiesKeV, oneHourSigma });
  const taken = candidates.map(
    ({ oneHourSigma: sigma }, index) => (sigma / points[index]!.sigma) ** 2,
  );
  const total = taken.reduce((sum, time) => sum + time, 0);
  return { candidates, hours: Float64Array.from(taken, (time) => (hours * time) / total) };
}
