import { DELTA_CHI_SQUARE_68, DELTA_CHI_SQUARE_95 } from '../constants';
import { chiSquareUpperTail } from '../statistics/chi-square';
import type { Interval } from '../types';
import { closedFormHolds } from './closed-form-holds';
import { jointCovariance, type JointCovariance } from './joint-covariance';
import type {
  JointFitAnswer,
  JointFitOptions,
  JointFitOutcome,
  JointParameter,
  JointParameterName,
  JointResidual,
} from './joint-fit-answer';
import type { JointFitInput } from './joint-fit-input';
import { jointInterval } from './joint-interval';
import { polishJoint, type JointMinimum } from './joint-polish';
import {
  jointProblem,
  priorCount,
  rowRate,
  whiten,
  type JointProblem,
  type RateMethod,
} from './joint-problem';
import { searchJointMinimum } from './joint-search';

/** Valleys over ν that are followed to their bottom. */
const MOST_STARTS = 4;
const MOST_RESTARTS = 3;

/**
 * Joint fit of temperature scans over implantation energies: λ(T) = λ₀ + rate(Λ_c, Λ_i(T)) with Λ_i = ν·exp(−E_A/kT), ν and
 * λ₀ shared by all energies, E_A shared or one per energy, one Λ_c ≥ 0 per energy that does not change over the temperatures
 * of a scan. Weighted least squares; Λ_c and λ₀ are linear in the closed form, so the minimum is searched for over ν and E_A
 * and then polished. No starting guess enters.
 *
 * @returns 'no-minimum' where no rate falls with temperature: χ² is not better by 3.84 than with one constant rate per
 * energy, and neither ν nor E_A can be told.
 * @throws InversionError for what checkJointFitInput refuses.
 */
export function fitTemperatureScans(
  input: JointFitInput,
  { intervalsFor = 'at bound', method = 'automatic' }: JointFitOptions = {},
): JointFitOutcome {
  const closed = jointProblem(input, 'closed form');
  const { starts, constantChiSquare } = searchJointMinimum(closed);
  const fromLattice = lowest(
    starts.slice(0, MOST_STARTS).map(({ theta }) => polishJoint(closed, theta)),
  );
  const needed = method === 'automatic' ? neededMethod(closed, fromLattice.theta) : method;
  const problem = needed === 'closed form' ? closed : { ...closed, method: needed };
  let minimum = problem === closed ? fromLattice : polishJoint(problem, fromLattice.theta);
  const undetermined = !closed.held[0] || !closed.held[1];
  if (undetermined && !(constantChiSquare - minimum.chiSquare >= DELTA_CHI_SQUARE_95)) {
    return {
      status: 'no-minimum',
      reason:
        'No rate falls with temperature in these scans, so neither the attempt frequency nor the activation energy can be told. Warmer points, or both held at known values, are needed.',
    };
  }
  for (let restart = 0; ; restart++) {
    const covariance = jointCovariance(problem, minimum.theta);
    const report = reportParameters(input, problem, minimum, covariance, intervalsFor);
    if (!report.better || restart === MOST_RESTARTS) {
      const answer = answerAt(
        input,
        problem,
        minimum,
        covariance,
        report.parameters,
        starts.length,
      );
      return { status: answer.status, answer };
    }
    minimum = polishJoint(problem, report.better);
  }
}

function lowest(minima: readonly JointMinimum[]): JointMinimum {
  return minima.reduce((best, one) => (one.chiSquare < best.chiSquare ? one : best));
}

function neededMethod(problem: JointProblem, theta: Float64Array): RateMethod {
  for (let row = 0; row < problem.rowCount; row++) {
    const capture = theta[problem.captureFrom + problem.scanOfRow[row]!]!;
    const { ionisation } = rowRate(problem, theta, row);
    if (!closedFormHolds(problem.cycle, capture, ionisation)) return 'exchange matrix';
  }
  return 'closed form';
}

function reportParameters(
  input: JointFitInput,
  problem: JointProblem,
  minimum: JointMinimum,
  covariance: JointCovariance,
  intervalsFor: 'at bound' | 'all',
): { parameters: JointParameter[]; better: Float64Array | null } {
  let better: Float64Array | null = null;
  const intervalOf = (k: number, rise: number): Interval => {
    const found = jointInterval(problem, minimum, k, rise);
    better ??= found.better;
    return found.interval;
  };
  const parameters = Array.from(minimum.theta, (value, k): JointParameter => {
    const held = problem.held[k] === 1;
    const atLower = value <= problem.lower[k]!;
    const atBound = held ? null : atLower ? 'lower' : value >= problem.upper[k]! ? 'upper' : null;
    const wanted = !held && !better && (intervalsFor === 'all' || atBound !== null);
    const place = covariance.ok ? covariance.indices.indexOf(k) : -1;
    return {
      ...nameOf(input, problem, k),
      value,
      sigma: covariance.ok && place >= 0 ? Math.sqrt(covariance.matrix[place]![place]!) : null,
      held,
      atBound,
      interval68: wanted ? intervalOf(k, DELTA_CHI_SQUARE_68) : null,
      interval95: wanted ? intervalOf(k, DELTA_CHI_SQUARE_95) : null,
    };
  });
  return { parameters, better };
}

function nameOf(
  { scans }: JointFitInput,
  { captureFrom, activationCount, size }: JointProblem,
  k: number,
): { name: JointParameterName; energyKeV: number | null } {
  if (k === 0) return { name: 'logAttempt', energyKeV: null };
  if (k === size - 1) return { name: 'baselinePerUs', energyKeV: null };
  if (k >= captureFrom) {
    return { name: 'capturePerUs', energyKeV: scans[k - captureFrom]!.energyKeV };
  }
  const energyKeV = activationCount === 1 ? null : scans[k - 1]!.energyKeV;
  return { name: 'activationMeV', energyKeV };
}

function answerAt(
  input: JointFitInput,
  problem: JointProblem,
  minimum: JointMinimum,
  covariance: JointCovariance,
  parameters: readonly JointParameter[],
  starts: number,
): JointFitAnswer {
  const free = parameters.filter(({ held }) => !held).length;
  const degreesOfFreedom = problem.rowCount + priorCount(problem) - free;
  const { status, chiSquare, iterations, predictedReduction, theta } = minimum;
  return {
    status,
    method: problem.method,
    parameters,
    covariance,
    chiSquare,
    degreesOfFreedom,
    pValue: degreesOfFreedom > 0 ? chiSquareUpperTail(chiSquare, degreesOfFreedom) : null,
    residuals: residualsOf(input, problem, theta),
    evidence: { starts, iterations, predictedReduction },
  };
}

/** All points in their order, those switched off with what the fit would say of them. */
function residualsOf(
  input: JointFitInput,
  problem: JointProblem,
  theta: Float64Array,
): JointResidual[] {
  const scans = input.scans.map((scan) => ({
    ...scan,
    points: scan.points.map((point) => ({ ...point, enabled: true })),
  }));
  const everything = { ...jointProblem({ ...input, scans }, problem.method) };
  const { residual } = whiten(everything, theta);
  return input.scans
    .flatMap(({ energyKeV, points }) => points.map((point) => ({ energyKeV, ...point })))
    .map(({ energyKeV, temperatureK, ratePerUs, sigma, enabled }, row) => ({
      energyKeV,
      temperatureK,
      observed: ratePerUs,
      sigma,
      predicted: ratePerUs - residual[row]! * sigma,
      reduced: residual[row]!,
      enabled,
    }));
}
