import type { FitStatus } from '../types';
import { minimise, type MinimiseScratch } from './minimise';
import type { Problem } from './model';
import { polish } from './polish';
import { refine, type RefineResult } from './refine';
import { scanGrid, startNodes, thetaOfNode } from './search';
import { openWidths } from './widths';

/** With many shape parameters a node says little of how deep its valley is; a few steps say enough to choose these many. */
const MOST_FOLLOWED = 6;
const FIRST_STEPS = { maxIterations: 8, tolerance: 1e-3 };
/** Convergence: what Φ may still fall by, relative to 1 + Φ: to tell valleys apart, for the polish, at the end. */
const VALLEY = { maxIterations: 60, tolerance: 1e-5 };
const POLISH_TOLERANCE = 1e-8;
const FINAL = { maxIterations: 100, tolerance: 1e-13 };

export interface GlobalMinimum {
  theta: Float64Array;
  chiSquare: number;
  status: FitStatus;
  folds: number;
  starts: number;
  iterations: number;
  predictedReduction: number;
  /** Largest χ² over the first shape parameter on the lattice, each at the best of the others: how much it matters at all. */
  highestChiSquare: number;
  /** χ² of the nodes of the lattice. */
  nodeChiSquares: Float64Array;
}

/**
 * Global minimum of Φ: χ² on the whole lattice of the shape with the levels solved exactly, then the best valleys polished (of
 * many, those that a few steps show to be deep), then the best of them to the last digits.
 */
export function searchMinimum(problem: Problem, scratch: MinimiseScratch): GlobalMinimum {
  const { model } = problem;
  const { grid, held, neutral, size } = model;
  const chiSquares = new Float64Array(grid.nodeCount);
  scanGrid(problem, neutral, held, chiSquares);
  const nodes = startNodes(model, chiSquares);
  let best = Infinity;
  let iterations = 0;
  const theta = new Float64Array(size);
  const starts = nodes.map((node) => {
    const start = new Float64Array(size);
    thetaOfNode(model, node, neutral, start);
    openWidths(model, start, held);
    return { start, chiSquare: chiSquares[node]! };
  });
  if (starts.length > MOST_FOLLOWED) {
    for (const tried of starts) {
      const result = refine(problem, tried.start, held, scratch.refine, FIRST_STEPS);
      iterations += result.iterations;
      tried.chiSquare = result.chiSquare;
    }
    starts.sort((a, b) => a.chiSquare - b.chiSquare).splice(MOST_FOLLOWED);
  }
  for (const { start } of starts) {
    const result = minimise(problem, start, held, scratch, VALLEY);
    iterations += result.iterations;
    if (result.chiSquare < best) {
      best = result.chiSquare;
      theta.set(start);
    }
  }
  const evidence = { folds: grid.nodeCount + iterations, starts: nodes.length, iterations };
  if (!model.trial.kinked)
    evidence.iterations += polish(problem, theta, POLISH_TOLERANCE).iterations;
  return finish(problem, scratch, theta, evidence, {
    highestChiSquare: highestOverDepths(grid.axes, chiSquares),
    nodeChiSquares: chiSquares,
  });
}

/** The minimum below a point that lies lower than the one known. */
export function followMinimum(
  problem: Problem,
  scratch: MinimiseScratch,
  before: GlobalMinimum,
  better: Float64Array,
): GlobalMinimum {
  const evidence = {
    folds: before.folds,
    starts: before.starts + 1,
    iterations: before.iterations,
  };
  return finish(problem, scratch, Float64Array.from(better), evidence, before);
}

function finish(
  problem: Problem,
  scratch: MinimiseScratch,
  theta: Float64Array,
  evidence: { folds: number; starts: number; iterations: number },
  { highestChiSquare, nodeChiSquares }: Pick<GlobalMinimum, 'highestChiSquare' | 'nodeChiSquares'>,
): GlobalMinimum {
  const result = minimise(problem, theta, problem.model.held, scratch, FINAL);
  const chiSquare = closeWidths(problem, theta, result.chiSquare, scratch);
  return {
    theta,
    chiSquare,
    status: statusOf(result),
    folds: evidence.folds + result.iterations,
    starts: evidence.starts,
    iterations: evidence.iterations + result.iterations,
    predictedReduction: result.predictedReduction,
    highestChiSquare,
    nodeChiSquares,
  };
}

/** A polish that rounding stops, with next to nothing left to gain, has arrived. */
const ROUNDING = 1e-9;

function statusOf({
  converged,
  predictedReduction,
  chiSquare,
  iterations,
}: RefineResult): FitStatus {
  if (converged || predictedReduction <= ROUNDING * (1 + chiSquare)) return 'converged';
  return iterations >= FINAL.maxIterations ? 'iteration-limit' : 'stalled';
}

/** Widths above this share of their range are not taken for zero. */
const NEARLY_SHARP = 0.05;

/** Where a step fits as well as the width found, the width is zero: the lower bound, said as such. Returns Φ. */
function closeWidths(
  problem: Problem,
  theta: Float64Array,
  chiSquare: number,
  scratch: MinimiseScratch,
): number {
  const { model } = problem;
  let lowest = chiSquare;
  for (const k of model.widths) {
    if (model.held[k] || theta[k] === 0 || theta[k]! > NEARLY_SHARP * model.upper[k]!) continue;
    const step = Float64Array.from(theta);
    step[k] = 0;
    const held = Uint8Array.from(model.held);
    held[k] = 1;
    const { chiSquare: stepChiSquare } = minimise(problem, step, held, scratch, FINAL);
    if (stepChiSquare > lowest + ROUNDING * (1 + lowest)) continue;
    theta.set(step);
    lowest = stepChiSquare;
  }
  return lowest;
}

function highestOverDepths([depths]: readonly Float64Array[], chiSquares: Float64Array): number {
  const lowest = new Float64Array(depths!.length).fill(Infinity);
  chiSquares.forEach((chiSquare, node) => {
    const k = node % lowest.length;
    lowest[k] = Math.min(lowest[k]!, chiSquare);
  });
  return lowest.reduce((a, b) => Math.max(a, b), -Infinity);
}
