import type { GaussianPrior } from '../types';
import { chargeCycle, type ChargeCycle } from './charge-cycle';
import { closedFormRate } from './closed-form-rate';
import { exchangeRate } from './exchange-rate';
import { BOLTZMANN_MEV_PER_K } from './ionisation-rate';
import {
  ACTIVATION_BOUNDS_MEV,
  ATTEMPT_BOUNDS_PER_US,
  checkJointFitInput,
  type JointFitInput,
} from './joint-fit-input';
import type { RateAndSlopes } from './rate-and-slopes';

export type RateMethod = 'closed form' | 'exchange matrix';

/**
 * A joint fit laid out as numbers. θ = [ln(ν·µs), E_A (one or one per scan, meV), Λ_c per scan (µs⁻¹), λ₀ (µs⁻¹)];
 * rows are the enabled points, scan after scan.
 */
export interface JointProblem {
  cycle: ChargeCycle;
  method: RateMethod;
  scanCount: number;
  activationCount: number;
  /** Length of θ and the place of λ₀ in it, size − 1. */
  size: number;
  captureFrom: number;
  lower: Float64Array;
  upper: Float64Array;
  held: Uint8Array;
  heldValues: Float64Array;
  rowCount: number;
  rates: Float64Array;
  inverseSigma: Float64Array;
  /** 1/kT, meV⁻¹. */
  inverseKT: Float64Array;
  scanOfRow: Int32Array;
  activationPrior: GaussianPrior | null;
}

/** @throws InversionError for what checkJointFitInput refuses. */
export function jointProblem(input: JointFitInput, method: RateMethod): JointProblem {
  checkJointFitInput(input);
  const { scans } = input;
  const rows = scans.flatMap(({ points }, scan) =>
    points.filter(({ enabled }) => enabled).map((point) => ({ ...point, scan })),
  );
  const activationCount = input.activation === 'shared' ? 1 : scans.length;
  const captureFrom = 1 + activationCount;
  const size = captureFrom + scans.length + 1;
  const place = (values: {
    attempt: number;
    activation: number;
    capture: number;
    baseline: number;
  }) =>
    Float64Array.from({ length: size }, (_, k) => {
      if (k === 0) return values.attempt;
      if (k < captureFrom) return values.activation;
      return k < size - 1 ? values.capture : values.baseline;
    });
  const { heldAttemptPerUs, heldActivationMeV, heldBaselinePerUs } = input;
  const isHeld = (value: number | undefined): number => (value === undefined ? 0 : 1);
  return {
    cycle: chargeCycle(input.hyperfineMHz, input.fieldMt),
    method,
    scanCount: scans.length,
    activationCount,
    size,
    captureFrom,
    lower: place({
      attempt: Math.log(ATTEMPT_BOUNDS_PER_US[0]),
      activation: ACTIVATION_BOUNDS_MEV[0],
      capture: 0,
      baseline: 0,
    }),
    upper: place({
      attempt: Math.log(ATTEMPT_BOUNDS_PER_US[1]),
      activation: ACTIVATION_BOUNDS_MEV[1],
      capture: Infinity,
      baseline: Infinity,
    }),
    held: Uint8Array.from(
      place({
        attempt: isHeld(heldAttemptPerUs),
        activation: isHeld(heldActivationMeV),
        capture: 0,
        baseline: isHeld(heldBaselinePerUs),
      }),
    ),
    heldValues: place({
      attempt: Math.log(heldAttemptPerUs ?? 1),
      activation: heldActivationMeV ?? NaN,
      capture: NaN,
      baseline: heldBaselinePerUs ?? NaN,
    }),
    rowCount: rows.length,
    rates: Float64Array.from(rows, ({ ratePerUs }) => ratePerUs),
    inverseSigma: Float64Array.from(rows, ({ sigma }) => 1 / sigma),
    inverseKT: Float64Array.from(
      rows,
      ({ temperatureK }) => 1 / (BOLTZMANN_MEV_PER_K * temperatureK),
    ),
    scanOfRow: Int32Array.from(rows, ({ scan }) => scan),
    activationPrior: input.activationPriorMeV ?? null,
  };
}

/** Place in θ of the E_A of a scan. */
export function activationIndex({ activationCount }: JointProblem, scan: number): number {
  return activationCount === 1 ? 1 : 1 + scan;
}

/** λ of one row at θ, with the slopes of its capture part, and Λ_i. */
export function rowRate(
  problem: JointProblem,
  theta: Float64Array,
  row: number,
): RateAndSlopes & { predicted: number; ionisation: number } {
  const scan = problem.scanOfRow[row]!;
  const activation = theta[activationIndex(problem, scan)]!;
  // A rate that underflows still has to be a positive number: its slopes vanish either way.
  const ionisation = Math.max(
    Math.exp(theta[0]! - activation * problem.inverseKT[row]!),
    Number.MIN_VALUE / Number.EPSILON,
  );
  const capture = theta[problem.captureFrom + scan]!;
  const rate = problem.method === 'closed form' ? closedFormRate : exchangeRate;
  const { ratePerUs, byCapture, byIonisation } = rate(problem.cycle, capture, ionisation);
  const predicted = ratePerUs + theta[problem.size - 1]!;
  return { ratePerUs, byCapture, byIonisation, predicted, ionisation };
}

/** Whitened rows: residuals (observed − predicted)/σ, a prior row per E_A, and their Jacobian of the prediction. */
export interface WhitenedRows {
  count: number;
  residual: Float64Array;
  /** Jacobian[k·count + row] = ∂(prediction/σ)/∂θ_k. */
  jacobian: Float64Array;
  chiSquare: number;
}

export function priorCount({ activationPrior, activationCount }: JointProblem): number {
  return activationPrior ? activationCount : 0;
}

/** χ², residuals and analytic Jacobian at θ. */
export function whiten(problem: JointProblem, theta: Float64Array): WhitenedRows {
  const { rowCount, size, captureFrom, inverseSigma, activationPrior: prior } = problem;
  const count = rowCount + priorCount(problem);
  const residual = new Float64Array(count);
  const jacobian = new Float64Array(size * count);
  for (let row = 0; row < rowCount; row++) {
    const weight = inverseSigma[row]!;
    const scan = problem.scanOfRow[row]!;
    const { predicted, byCapture, byIonisation, ionisation } = rowRate(problem, theta, row);
    residual[row] = (problem.rates[row]! - predicted) * weight;
    const byLog = byIonisation * ionisation * weight;
    jacobian[row] = byLog;
    jacobian[activationIndex(problem, scan) * count + row] = -byLog * problem.inverseKT[row]!;
    jacobian[(captureFrom + scan) * count + row] = byCapture * weight;
    jacobian[(size - 1) * count + row] = weight;
  }
  if (prior) {
    for (let a = 0; a < problem.activationCount; a++) {
      residual[rowCount + a] = (prior.mean - theta[1 + a]!) / prior.sigma;
      jacobian[(1 + a) * count + rowCount + a] = 1 / prior.sigma;
    }
  }
  const chiSquare = residual.reduce((sum, value) => sum + value * value, 0);
  return { count, residual, jacobian, chiSquare };
}
