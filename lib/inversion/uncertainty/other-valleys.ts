import type { MinimiseScratch } from '../fit/minimise';
import type { Model, Problem } from '../fit/model';
import { refine } from '../fit/refine';
import { areNeighbours, thetaOfNode } from '../fit/search';
import { openWidths } from '../fit/widths';

/** Nodes tried at each value, and the few steps that show how deep their valleys are. */
const MOST_TRIED = 4;
const FIRST_STEPS = { maxIterations: 8, tolerance: 1e-3 };

/**
 * Where the best of a profile with several edges lies in another valley once θ_k is held at x: nodes of the search lattice on both
 * sides of x, the best ones that are no neighbours, each with θ_k = x and a few steps. For a level or the depth scale, which the
 * lattice does not hold, the best nodes of all.
 *
 * @param nodeChiSquares χ² of the nodes, from the search.
 * @returns a function that writes the lowest point found at x into `into` and gives its Φ.
 */
export function otherValleys(
  problem: Problem,
  scratch: MinimiseScratch,
  nodeChiSquares: Float64Array,
  held: Uint8Array,
  k: number,
): (x: number, into: Float64Array) => number {
  const { model } = problem;
  const bySlab = new Map<number, number[]>();
  const trial = new Float64Array(model.size);
  return (x, into) => {
    const slab = slabOf(model, k, x);
    const nodes = bySlab.get(slab) ?? bestNodes(model, nodeChiSquares, k, slab);
    bySlab.set(slab, nodes);
    let lowest = Infinity;
    for (const node of nodes) {
      thetaOfNode(model, node, model.neutral, trial);
      trial[k] = x;
      openWidths(model, trial, held);
      const { chiSquare } = refine(problem, trial, held, scratch.refine, FIRST_STEPS);
      if (chiSquare >= lowest) continue;
      lowest = chiSquare;
      into.set(trial);
    }
    return lowest;
  };
}

/** Place of the node of axis k at or below x. */
function slabOf({ grid, shapeCount }: Model, k: number, x: number): number {
  if (k >= shapeCount) return 0;
  const axis = grid.axes[k]!;
  let place = 0;
  while (place < axis.length - 2 && axis[place + 1]! <= x) place++;
  return place;
}

function bestNodes(
  { grid, shapeCount }: Model,
  chiSquares: Float64Array,
  k: number,
  slab: number,
): number[] {
  let stride = 1;
  for (let l = 0; l < Math.min(k, shapeCount); l++) stride *= grid.axes[l]!.length;
  const nodes: number[] = [];
  for (let node = 0; node < chiSquares.length; node++) {
    const place = k < shapeCount ? Math.floor(node / stride) % grid.axes[k]!.length : slab;
    if (place === slab || place === slab + 1) nodes.push(node);
  }
  nodes.sort((a, b) => chiSquares[a]! - chiSquares[b]!);
  const best: number[] = [];
  for (const node of nodes) {
    if (best.length === MOST_TRIED) break;
    if (!best.some((other) => areNeighbours(grid.axes, node, other))) best.push(node);
  }
  return best;
}
