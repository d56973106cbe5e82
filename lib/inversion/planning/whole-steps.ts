import { designState, whitenDesign, type DesignProblem } from './c-optimal';

export interface WholeSteps {
  /** Hours at each candidate, whole multiples of the step. */
  hours: Float64Array;
  variance: number;
}

/**
 * The split in whole steps of time that grows out of the continuous one: its whole steps first, the rest one by one where they
 * help most, then single steps are exchanged until no exchange helps. No exchange of one step makes it better; that none of two
 * would is not proved, but the variance of the continuous split bounds what is left.
 *
 * @param count number of steps to give out.
 */
export function wholeSteps(
  problem: DesignProblem,
  continuous: Float64Array,
  stepHours: number,
  count: number,
): WholeSteps {
  const design = whitenDesign(problem);
  const total = continuous.reduce((sum, value) => sum + value, 0);
  const steps = Array.from(continuous, (value) => Math.floor((value / total) * count));
  const hoursOf = (): Float64Array => Float64Array.from(steps, (n) => n * stepHours);
  const varianceOf = (): number => designState(design, hoursOf()).variance;
  const varianceWith = (k: number): number => {
    steps[k]!++;
    const variance = varianceOf();
    steps[k]!--;
    return variance;
  };
  const best = (): { k: number; variance: number } => {
    let answer = { k: 0, variance: Infinity };
    steps.forEach((_, k) => {
      const variance = varianceWith(k);
      if (variance < answer.variance) answer = { k, variance };
    });
    return answer;
  };
  for (let given = steps.reduce((a, b) => a + b, 0); given < count; given++) steps[best().k]!++;
  let variance = varianceOf();
  for (let from = 0; from < steps.length; from++) {
    if (steps[from] === 0) continue;
    steps[from]!--;
    const { k, variance: exchanged } = best();
    if (k !== from && exchanged < variance * (1 - ROUNDING)) {
      steps[k]!++;
      variance = exchanged;
      from = -1;
    } else steps[from]!++;
  }
  return { hours: hoursOf(), variance };
}

/** A gain below this share is rounding, and could go round in circles. */
const ROUNDING = 1e-12;
