import { covarianceAt } from '../uncertainty/covariance';
import { chiSquareUpperTail } from '../statistics/chi-square';
import type {
  Covariance,
  FitAnswer,
  FitParameter,
  FitStatus,
  Interval,
  ParameterName,
  Residual,
} from '../types';
import { DELTA_CHI_SQUARE_68, DELTA_CHI_SQUARE_95 } from '../constants';
import { dataChiSquare, evaluate } from './evaluate';
import type { Problem } from './model';
import type { PreparedFit } from './prepared-fit';
import { searchMinimum, type GlobalMinimum } from './search-minimum';

export type FitOutcome =
  { status: FitStatus; answer: FitAnswer } | { status: 'no-minimum'; reason: string };

export interface FitOptions {
  /** Parameters whose profile-likelihood intervals are wanted; all free ones when left out. */
  intervalsFor?: readonly ParameterName[];
}

/** Convergence of the final polish: what Φ could still fall by, relative to 1 + Φ. */
const FINAL_TOLERANCE = 1e-13;

/**
 * Least squares with bounds and priors (physics section 4): global search, polish, covariance, intervals, evidence.
 * Returns 'no-minimum' where the scan says nothing of the edge: χ² rises by less than 1 wherever the edge lies.
 */
export function fit(prepared: PreparedFit, options: FitOptions = {}): FitOutcome {
  const { problem, scratch } = prepared;
  const minimum = searchMinimum(problem, scratch, FINAL_TOLERANCE);
  if (!Number.isFinite(minimum.chiSquare))
    return { status: 'no-minimum', reason: 'χ² is not finite anywhere.' };
  if (
    !problem.model.held[0] &&
    minimum.highestChiSquare - minimum.chiSquare < DELTA_CHI_SQUARE_68
  ) {
    return {
      status: 'no-minimum',
      reason:
        'The scan does not say where the edge is: χ² changes by less than 1 wherever the edge lies. More contrast between the levels, more energies or smaller uncertainties are needed.',
    };
  }
  const status: FitStatus = minimum.converged
    ? 'converged'
    : minimum.iterations >= 100
      ? 'iteration-limit'
      : 'stalled';
  return { status, answer: answerAt(prepared, minimum, status, options) };
}

function answerAt(
  prepared: PreparedFit,
  minimum: GlobalMinimum,
  status: FitStatus,
  options: FitOptions,
): FitAnswer {
  const { problem, freeNames, enabledCount, priorCount } = prepared;
  const { theta } = minimum;
  const covariance = covarianceAt(problem, theta);
  const chiSquare = evaluate(problem, theta, problem.model.held);
  const dataTerm = dataChiSquare(problem.model, problem.data, problem.work);
  const residuals = residualsOf(prepared);
  const k = freeNames.length;
  const n = enabledCount + priorCount;
  const degreesOfFreedom = n - k;
  const wanted = options.intervalsFor ?? freeNames;
  return {
    status,
    parameters: problem.model.names.map((_, index) =>
      parameterOf(problem, theta, index, covariance, wanted),
    ),
    chiSquare,
    dataChiSquare: dataTerm,
    degreesOfFreedom,
    pValue: degreesOfFreedom > 0 ? chiSquareUpperTail(chiSquare, degreesOfFreedom) : null,
    freeParameters: k,
    aicc: n > k + 1 ? chiSquare + 2 * k + (2 * k * (k + 1)) / (n - k - 1) : null,
    bic: chiSquare + k * Math.log(n),
    covariance,
    residuals,
    evidence: {
      folds: minimum.folds,
      starts: minimum.starts,
      iterations: minimum.iterations,
      predictedReduction: minimum.predictedReduction,
    },
  };
}

function parameterOf(
  { model }: Problem,
  theta: Float64Array,
  k: number,
  covariance: Covariance,
  _wanted: readonly ParameterName[],
): FitParameter {
  const name = model.names[k]!;
  const value = theta[k]!;
  const held = model.held[k] === 1;
  const sigma = sigmaOf(covariance, name);
  const interval = (delta: number): Interval => {
    if (held || sigma === null) return [null, null];
    const half = Math.sqrt(delta) * sigma;
    return [Math.max(model.lower[k]!, value - half), Math.min(model.upper[k]!, value + half)];
  };
  return {
    name,
    value,
    sigma,
    interval68: interval(DELTA_CHI_SQUARE_68),
    interval95: interval(DELTA_CHI_SQUARE_95),
    held,
    atBound: held
      ? null
      : value <= model.lower[k]!
        ? 'lower'
        : value >= model.upper[k]!
          ? 'upper'
          : null,
    symmetric: sigma !== null,
  };
}

export function sigmaOf(covariance: Covariance, name: ParameterName): number | null {
  if (!covariance.ok) return null;
  const k = covariance.names.indexOf(name);
  return k < 0 ? null : Math.sqrt(covariance.matrix[k]![k]!);
}

/** Residuals in the order of the scan, from the prediction in the workspace. */
function residualsOf({ input, profiles, problem }: PreparedFit): Residual[] {
  const { pointOfRow } = problem.model;
  const predicted = new Map(
    Array.from(pointOfRow, (point, row) => [point, problem.work.predicted[row]!]),
  );
  return input.points.flatMap((point, index) => {
    const value = predicted.get(index);
    if (value === undefined) return [];
    return {
      energyKeV: point.energyKeV,
      observed: point.value,
      sigma: point.sigma,
      predicted: value,
      reduced: (point.value - value) / point.sigma,
      enabled: point.enabled,
      interpolated: profiles[index]!.interpolatedBetween !== null,
    };
  });
}
