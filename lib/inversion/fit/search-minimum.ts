import { evaluate } from './evaluate';
import { minimise, type MinimiseScratch } from './minimise';
import type { Model, Problem } from './model';
import type { RefineResult } from './refine';
import { localMinima, scanGrid, thetaOfNode } from './search';

/** Valleys of the coarse search that are followed to their bottom. */
const STARTS = 3;

export interface GlobalMinimum extends RefineResult {
  theta: Float64Array;
  folds: number;
  starts: number;
  /** Largest χ² over the depths of the lattice, each at its best width: how much the edge matters at all. */
  highestChiSquare: number;
}

/**
 * Global minimum of Φ: χ² on the whole lattice of edges and widths with the levels solved exactly, then the best
 * valleys polished. No starting guess enters.
 */
export function searchMinimum(
  problem: Problem,
  scratch: MinimiseScratch,
  tolerance: number,
): GlobalMinimum {
  const { model } = problem;
  const { grid, held, neutral, size } = model;
  const chiSquares = new Float64Array(grid.nodeCount);
  scanGrid(problem, neutral, held, chiSquares);
  const starts = localMinima(grid.lattice, chiSquares).slice(0, STARTS);
  let best: GlobalMinimum | null = null;
  let iterations = 0;
  for (const node of starts) {
    const theta = new Float64Array(size);
    thetaOfNode(model, node, neutral, theta);
    openWidth(model, theta);
    const result = minimise(problem, theta, held, scratch, { maxIterations: 100, tolerance });
    iterations += result.iterations;
    if (!best || result.chiSquare < best.chiSquare) {
      best = {
        ...result,
        theta,
        folds: 0,
        starts: starts.length,
        highestChiSquare: highestOverDepths(grid.lattice, chiSquares),
      };
    }
  }
  const answer = best!;
  closeWidth(problem, answer, scratch);
  evaluate(problem, answer.theta, held);
  return { ...answer, iterations, folds: grid.nodeCount + iterations };
}

const WIDTH = 1;

/** At width zero the derivative by the width vanishes: a polish that begins there never leaves it. Begin beside it. */
export function openWidth(model: Model, theta: Float64Array): void {
  if (model.shapeCount < 2 || model.held[WIDTH] || theta[WIDTH]! > 0) return;
  theta[WIDTH] = 0.006 * model.upper[WIDTH]!;
}

/** Where a step fits as well as the width found, the width is zero: the lower bound, said as such. */
function closeWidth(problem: Problem, answer: GlobalMinimum, scratch: MinimiseScratch): void {
  const { model } = problem;
  if (model.shapeCount < 2 || model.held[WIDTH] || answer.theta[WIDTH] === 0) return;
  if (answer.theta[WIDTH]! > 0.05 * model.upper[WIDTH]!) return;
  const theta = Float64Array.from(answer.theta);
  theta[WIDTH] = 0;
  const held = Uint8Array.from(model.held);
  held[WIDTH] = 1;
  const step = minimise(problem, theta, held, scratch, { maxIterations: 100, tolerance: 1e-12 });
  if (step.chiSquare > answer.chiSquare) return;
  answer.theta.set(theta);
  answer.chiSquare = step.chiSquare;
}

function highestOverDepths(
  [lines, perLine]: readonly [number, number],
  chiSquares: Float64Array,
): number {
  let highest = -Infinity;
  for (let k = 0; k < perLine; k++) {
    let lowest = Infinity;
    for (let line = 0; line < lines; line++)
      lowest = Math.min(lowest, chiSquares[line * perLine + k]!);
    highest = Math.max(highest, lowest);
  }
  return highest;
}
