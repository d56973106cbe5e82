import { DELTA_CHI_SQUARE_68 } from '../constants';
import { chiSquareUpperTail } from '../statistics/chi-square';
import type {
  Covariance,
  FitAnswer,
  FitParameter,
  FitStatus,
  ParameterName,
  Residual,
} from '../types';
import { covarianceAt } from '../uncertainty/covariance';
import { reportParameters } from '../uncertainty/parameter-report';
import { dataChiSquare, evaluate, predictFromFold } from './evaluate';
import type { PreparedFit } from './prepared-fit';
import { followMinimum, searchMinimum, type GlobalMinimum } from './search-minimum';

export type FitOutcome =
  { status: FitStatus; answer: FitAnswer } | { status: 'no-minimum'; reason: string };

export interface FitOptions {
  /** Parameters whose profile-likelihood intervals are wanted; all free ones when left out. */
  intervalsFor?: readonly ParameterName[];
}

/** Lower minima met while walking out the intervals that are followed before the fit is given out as it is. */
const MOST_RESTARTS = 3;

/**
 * Regularised least squares with bounds and priors: global search over the edge, polish, covariance, profile-likelihood
 * intervals, evidence. No starting guess enters.
 *
 * @returns 'no-minimum' where the scan says nothing of the edge: χ² changes by less than 1 wherever the edge lies.
 */
export function fit(prepared: PreparedFit, options: FitOptions = {}): FitOutcome {
  const { problem, scratch } = prepared;
  let minimum = searchMinimum(problem, scratch);
  const reason = unusable(prepared, minimum);
  if (reason) return { status: 'no-minimum', reason };
  for (let restart = 0; ; restart++) {
    const covariance = covarianceAt(problem, minimum.theta);
    // Where one lower minimum after another turns up, the last is given out with its linear intervals.
    const wanted = restart > MOST_RESTARTS ? [] : (options.intervalsFor ?? prepared.freeNames);
    const report = reportParameters(problem, scratch, { ...minimum, covariance }, wanted);
    if (!report.better) {
      const answer = answerAt(prepared, minimum, covariance, report.parameters);
      return { status: answer.status, answer };
    }
    minimum = followMinimum(problem, scratch, minimum, report.better);
  }
}

function unusable({ problem }: PreparedFit, minimum: GlobalMinimum): string | null {
  if (!Number.isFinite(minimum.chiSquare)) return 'χ² is not finite at any depth of the edge.';
  if (problem.model.held[0] || minimum.highestChiSquare - minimum.chiSquare >= DELTA_CHI_SQUARE_68)
    return null;
  const [what, where] =
    problem.model.trial.kind === 'band-bending'
      ? ['how far the bands bend', 'however far they do']
      : ['where the edge is', 'wherever the edge lies'];
  return `The scan does not say ${what}: χ² changes by less than 1 ${where}. It needs more contrast between the levels, more energies or smaller uncertainties.`;
}

function answerAt(
  prepared: PreparedFit,
  minimum: GlobalMinimum,
  covariance: Covariance,
  parameters: readonly FitParameter[],
): FitAnswer {
  const { problem, freeNames, enabledCount, priorCount } = prepared;
  const chiSquare = evaluate(problem, minimum.theta, problem.model.held);
  const k = freeNames.length;
  const n = enabledCount + priorCount;
  const { folds, starts, iterations, predictedReduction, status } = minimum;
  return {
    status,
    parameters,
    chiSquare,
    dataChiSquare: dataChiSquare(problem.model, problem.data, problem.work, minimum.theta),
    degreesOfFreedom: n - k,
    pValue: n > k ? chiSquareUpperTail(chiSquare, n - k) : null,
    freeParameters: k,
    aicc: n > k + 1 ? chiSquare + 2 * k + (2 * k * (k + 1)) / (n - k - 1) : null,
    bic: chiSquare + k * Math.log(n),
    covariance,
    residuals: residualsOf(prepared, minimum.theta),
    evidence: { folds, starts, iterations, predictedReduction },
  };
}

/** Residuals in the order of the scan, from the fold in the workspace; a point without a stopping profile has none. */
function residualsOf({ input, profiles, problem }: PreparedFit, theta: Float64Array): Residual[] {
  const { model, work } = problem;
  predictFromFold(model, work, theta);
  const rowOfPoint = new Map(Array.from(model.pointOfRow, (point, row) => [point, row]));
  return input.points.flatMap(({ energyKeV, value, sigma, enabled }, index) => {
    const row = rowOfPoint.get(index);
    if (row === undefined) return [];
    const predicted = work.predicted[row]!;
    return {
      energyKeV,
      observed: value,
      sigma,
      predicted,
      reduced: (value - predicted) / sigma,
      enabled,
      interpolated: profiles[index]!.interpolatedBetween !== null,
    };
  });
}
