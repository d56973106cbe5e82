import { dephasedShare } from './closed-form-rate';
import { meanOffsetPerUs } from './charge-cycle';
import { ACTIVATION_BOUNDS_MEV, ATTEMPT_BOUNDS_PER_US } from './joint-fit-input';
import type { JointProblem } from './joint-problem';
import { linearRates, type ScanSums, type TotalSums } from './linear-rates';

export interface JointStart {
  theta: Float64Array;
  chiSquare: number;
}

const ATTEMPT_NODES = 32;
const STEP_NODES = 48;
const BASELINE_NODES = 24;

/**
 * χ² of the closed form over a lattice of ν and of the temperature T* at which the relaxation gives way,
 * E_A = kT*·ln(ν/ω̄) with ω̄ = √(Σ a_jΔω_j²), the Λ_c and λ₀ solved exactly at every node. No starting guess enters.
 *
 * @returns the lowest valleys over ν, best first, and χ² with no fall of the rate at all.
 */
export function searchJointMinimum(problem: JointProblem): {
  starts: JointStart[];
  constantChiSquare: number;
} {
  const total = totalSums(problem);
  const offset = meanOffsetPerUs(problem.cycle);
  const steps = stepNodes(problem);
  const starts = attemptNodes(problem, offset).map((logAttempt) => {
    const nodes = steps.map((inverseKT) => {
      const free = (logAttempt - Math.log(offset)) / inverseKT;
      const activation = problem.held[1] ? problem.heldValues[1]! : clampActivation(free);
      return { activation, sums: scanSums(problem, logAttempt, activation) };
    });
    return problem.activationCount === 1
      ? bestShared(problem, total, logAttempt, nodes)
      : bestPerScan(problem, total, logAttempt, nodes);
  });
  return { starts: valleys(starts), constantChiSquare: constantChiSquare(problem) };
}

interface StepNode {
  activation: number;
  sums: ScanSums[];
}

function bestShared(
  problem: JointProblem,
  total: TotalSums,
  logAttempt: number,
  nodes: readonly StepNode[],
): JointStart {
  let best: JointStart = { theta: new Float64Array(problem.size), chiSquare: Infinity };
  for (const { activation, sums } of nodes) {
    const { baseline, captures, chiSquare } = linearRates(sums, total, heldBaseline(problem));
    const withPrior = chiSquare + priorTerm(problem, activation);
    if (withPrior >= best.chiSquare) continue;
    const theta = Float64Array.from([logAttempt, activation, ...captures, baseline]);
    best = { theta, chiSquare: withPrior };
  }
  return best;
}

/** With an E_A per scan the scans are independent of each other once ν and λ₀ are given: λ₀ is scanned too. */
function bestPerScan(
  problem: JointProblem,
  total: TotalSums,
  logAttempt: number,
  nodes: readonly StepNode[],
): JointStart {
  let best: JointStart = { theta: new Float64Array(problem.size), chiSquare: Infinity };
  for (const level of baselineNodes(problem)) {
    const chosen = Array.from({ length: problem.scanCount }, (_, scan) =>
      nodes.reduce(
        (lowest, node) => {
          const gain = scanGain(node.sums[scan]!, level) - priorTerm(problem, node.activation);
          return gain > lowest.gain ? { gain, node } : lowest;
        },
        { gain: -Infinity, node: nodes[0]! },
      ),
    );
    const sums = chosen.map(({ node }, scan) => node.sums[scan]!);
    const { baseline, captures, chiSquare } = linearRates(sums, total, heldBaseline(problem));
    const activations = chosen.map(({ node }) => node.activation);
    const prior = activations.reduce((sum, value) => sum + priorTerm(problem, value), 0);
    if (chiSquare + prior >= best.chiSquare) continue;
    const theta = Float64Array.from([logAttempt, ...activations, ...captures, baseline]);
    best = { theta, chiSquare: chiSquare + prior };
  }
  return best;
}

function scanGain({ gg, g1, gy }: ScanSums, baseline: number): number {
  const left = gy - baseline * g1;
  return left > 0 && gg > 0 ? (left * left) / gg : 0;
}

/** Local minima along ν, lowest first. */
function valleys(starts: readonly JointStart[]): JointStart[] {
  return starts
    .filter(({ chiSquare }, k) => {
      const before = starts[k - 1]?.chiSquare ?? Infinity;
      const after = starts[k + 1]?.chiSquare ?? Infinity;
      return chiSquare <= before && chiSquare <= after;
    })
    .sort((one, other) => one.chiSquare - other.chiSquare);
}

function attemptNodes({ held, heldValues }: JointProblem, offset: number): number[] {
  if (held[0]) return [heldValues[0]!];
  // Below about ω̄ ionisation never catches up with the precession and no scan falls.
  const from = Math.log(Math.max(ATTEMPT_BOUNDS_PER_US[0], 1.5 * offset));
  return spaced(from, Math.log(ATTEMPT_BOUNDS_PER_US[1]), ATTEMPT_NODES);
}

/** 1/kT* from half the lowest to twice the highest temperature, evenly in its logarithm; one node where E_A is held. */
function stepNodes({ held, inverseKT }: JointProblem): number[] {
  if (held[1]) return [1];
  const from = Math.log(Math.min(...inverseKT) / 2);
  const to = Math.log(Math.max(...inverseKT) * 2);
  return spaced(from, to, STEP_NODES).map(Math.exp);
}

function baselineNodes(problem: JointProblem): number[] {
  const held = heldBaseline(problem);
  if (held !== null) return [held];
  const highest = problem.rates.reduce((most, rate) => Math.max(most, rate), 0);
  return spaced(0, highest, BASELINE_NODES);
}

function spaced(from: number, to: number, count: number): number[] {
  return Array.from({ length: count }, (_, k) => from + ((to - from) * k) / (count - 1));
}

function clampActivation(value: number): number {
  return Math.min(Math.max(value, ACTIVATION_BOUNDS_MEV[0]), ACTIVATION_BOUNDS_MEV[1]);
}

function heldBaseline({ held, heldValues, size }: JointProblem): number | null {
  return held[size - 1] ? heldValues[size - 1]! : null;
}

function priorTerm({ activationPrior: prior }: JointProblem, activation: number): number {
  return prior ? ((activation - prior.mean) / prior.sigma) ** 2 : 0;
}

function scanSums(problem: JointProblem, logAttempt: number, activation: number): ScanSums[] {
  const sums = Array.from({ length: problem.scanCount }, () => ({ gg: 0, g1: 0, gy: 0 }));
  for (let row = 0; row < problem.rowCount; row++) {
    const weight = problem.inverseSigma[row]! * problem.inverseSigma[row]!;
    const ionisation = Math.exp(logAttempt - activation * problem.inverseKT[row]!);
    const share = dephasedShare(problem.cycle, ionisation);
    const scan = sums[problem.scanOfRow[row]!]!;
    scan.gg += weight * share * share;
    scan.g1 += weight * share;
    scan.gy += weight * share * problem.rates[row]!;
  }
  return sums;
}

function totalSums({ rowCount, inverseSigma, rates }: JointProblem): TotalSums {
  const total = { ones: 0, y: 0, yy: 0 };
  for (let row = 0; row < rowCount; row++) {
    const weight = inverseSigma[row]! * inverseSigma[row]!;
    total.ones += weight;
    total.y += weight * rates[row]!;
    total.yy += weight * rates[row]! * rates[row]!;
  }
  return total;
}

/** χ² of one constant rate per scan. */
function constantChiSquare(problem: JointProblem): number {
  const sums = Array.from({ length: problem.scanCount }, () => ({ ones: 0, y: 0 }));
  for (let row = 0; row < problem.rowCount; row++) {
    const scan = sums[problem.scanOfRow[row]!]!;
    const weight = problem.inverseSigma[row]! * problem.inverseSigma[row]!;
    scan.ones += weight;
    scan.y += weight * problem.rates[row]!;
  }
  let chiSquare = 0;
  for (let row = 0; row < problem.rowCount; row++) {
    const { ones, y } = sums[problem.scanOfRow[row]!]!;
    chiSquare += ((problem.rates[row]! - y / ones) * problem.inverseSigma[row]!) ** 2;
  }
  return chiSquare;
}
