import { levelEquations } from './evaluate';
import type { Problem } from './model';
import { solveBounded } from './solve-bounded';

/** χ² at every node, levels solved exactly, θ's priors on the nonlinear parameters included. Written to chiSquares. */
export function scanGrid(
  { model, data, work, fallback }: Problem,
  neutral: Float64Array,
  held: Uint8Array,
  chiSquares: Float64Array,
): number {
  const { grid, rowCount, shapeCount, levelCount, scaleIndex, priorInverseSigma } = model;
  const { gram, moment, levels, heldLevel } = work;
  let constant = 0;
  for (let i = 0; i < rowCount; i++) constant += (data.y[i]! * data.inverseSigma[i]!) ** 2;
  for (let k = shapeCount; k < model.size; k++) {
    const value = k === scaleIndex ? data.priorMean[k]! - neutral[k]! : data.priorMean[k]!;
    constant += (value * priorInverseSigma[k]!) ** 2;
  }
  for (let k = 0; k < levelCount; k++) heldLevel[k] = held[shapeCount + k]!;
  let best = 0;
  for (let node = 0; node < grid.nodeCount; node++) {
    levelEquations(model, data, grid.shares, node * rowCount, grid.capShares, gram, moment);
    for (let k = 0; k < levelCount; k++) levels[k] = neutral[shapeCount + k]!;
    let chiSquare =
      constant +
      solveBounded(
        levelCount,
        gram,
        moment,
        model.lower,
        model.upper,
        shapeCount,
        heldLevel,
        fallback,
        levels,
      );
    for (let k = 0; k < shapeCount; k++) {
      const weight = priorInverseSigma[k]!;
      if (weight > 0)
        chiSquare += ((grid.shapes[node * shapeCount + k]! - data.priorMean[k]!) * weight) ** 2;
    }
    chiSquares[node] = chiSquare;
    if (chiSquare < chiSquares[best]!) best = node;
  }
  return best;
}

/** Local minima of the lattice (no better neighbour among eight), best first. */
export function localMinima(
  lattice: readonly [number, number],
  chiSquares: Float64Array,
): number[] {
  const [lines, perLine] = lattice;
  const minima: number[] = [];
  for (let line = 0; line < lines; line++) {
    for (let k = 0; k < perLine; k++) {
      if (isLocalMinimum(lines, perLine, line, k, chiSquares)) minima.push(line * perLine + k);
    }
  }
  return minima.sort((a, b) => chiSquares[a]! - chiSquares[b]!);
}

function isLocalMinimum(
  lines: number,
  perLine: number,
  line: number,
  k: number,
  chiSquares: Float64Array,
): boolean {
  const here = chiSquares[line * perLine + k]!;
  for (let l = Math.max(0, line - 1); l <= Math.min(lines - 1, line + 1); l++) {
    for (let j = Math.max(0, k - 1); j <= Math.min(perLine - 1, k + 1); j++) {
      const there = chiSquares[l * perLine + j]!;
      // A plateau counts once, at its first node.
      if (there < here || (there === here && l * perLine + j < line * perLine + k)) return false;
    }
  }
  return true;
}

/** Whether θ lies between the lattice neighbours of a node, so that the node belongs to the valley that θ is the bottom of. */
export function inValleyOf(
  { grid, shapeCount }: Problem['model'],
  node: number,
  theta: Float64Array,
): boolean {
  const [lines, perLine] = grid.lattice;
  const line = Math.floor(node / perLine);
  const k = node % perLine;
  const at = (l: number, j: number, parameter: number): number =>
    grid.shapes[(l * perLine + j) * shapeCount + parameter]!;
  const depthFits =
    (k === 0 || theta[0]! >= at(line, k - 1, 0)) &&
    (k === perLine - 1 || theta[0]! <= at(line, k + 1, 0));
  if (shapeCount < 2 || !depthFits) return depthFits;
  return (
    (line === 0 || theta[1]! >= at(line - 1, k, 1)) &&
    (line === lines - 1 || theta[1]! <= at(line + 1, k, 1))
  );
}

/** Shape of a node into θ, everything else neutral. */
export function thetaOfNode(
  { grid, shapeCount }: Problem['model'],
  node: number,
  neutral: Float64Array,
  theta: Float64Array,
): void {
  theta.set(neutral);
  for (let k = 0; k < shapeCount; k++) theta[k] = grid.shapes[node * shapeCount + k]!;
}
