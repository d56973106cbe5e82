import type { Model, Problem } from './model';
import { shapeOfNode } from './search-grid';
import { solveBounded } from './solve-bounded';

/** χ² at every node, levels solved exactly, the priors of the shape included. Written to chiSquares. */
export function scanGrid(
  { model, data, work, fallback }: Problem,
  neutral: Float64Array,
  held: Uint8Array,
  chiSquares: Float64Array,
): void {
  const { grid, rowCount, shapeCount, levelCount, scaleIndex, priorInverseSigma, unit } = model;
  const { gram, moment, levels, heldLevel } = work;
  const { target, priorMean } = data;
  const { shares, capShare, grams } = grid;
  let constant = 0;
  let unitMoment = 0;
  let capMoment = 0;
  for (let i = 0; i < rowCount; i++) {
    constant += target[i]! * target[i]!;
    unitMoment += unit[i]! * target[i]!;
    capMoment += capShare[i]! * target[i]!;
  }
  for (let k = shapeCount; k < model.size; k++) {
    const value = k === scaleIndex ? priorMean[k]! - neutral[k]! : priorMean[k]!;
    constant += (value * priorInverseSigma[k]!) ** 2;
  }
  for (let k = 0; k < levelCount; k++) heldLevel[k] = held[shapeCount + k]!;
  const size = levelCount * levelCount;
  for (let node = 0; node < grid.nodeCount; node++) {
    const at = node * rowCount;
    let bulkMoment = 0;
    for (let i = 0; i < rowCount; i++) bulkMoment += shares[at + i]! * target[i]!;
    moment[0] = unitMoment - bulkMoment - (levelCount > 2 ? capMoment : 0);
    moment[1] = bulkMoment;
    if (levelCount > 2) moment[2] = capMoment;
    for (let k = 0; k < size; k++) gram[k] = grams[node * size + k]!;
    for (let k = 0; k < levelCount; k++) {
      levels[k] = neutral[shapeCount + k]!;
      const weight = priorInverseSigma[shapeCount + k]! ** 2;
      moment[k] = moment[k]! + weight * priorMean[shapeCount + k]!;
    }
    chiSquares[node] =
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
  }
  addShapePriors(model, priorMean, chiSquares);
}

function addShapePriors(
  { grid, shapeCount, priorInverseSigma }: Model,
  priorMean: Float64Array,
  chiSquares: Float64Array,
): void {
  let stride = 1;
  for (let k = 0; k < shapeCount; k++) {
    const axis = grid.axes[k]!;
    const weight = priorInverseSigma[k]!;
    if (weight > 0) {
      for (let node = 0; node < grid.nodeCount; node++) {
        const value = axis[Math.floor(node / stride) % axis.length]!;
        chiSquares[node] = chiSquares[node]! + ((value - priorMean[k]!) * weight) ** 2;
      }
    }
    stride *= axis.length;
  }
}

/**
 * Nodes to follow to the bottom, best first: local minima of the lattice. Where a profile has several widths, their few nodes are
 * all neighbours of each other and one broad valley would hide the rest; there each combination of widths has minima of its own,
 * and one that lies next to a better one is left out.
 */
export function startNodes({ grid, trial, widths }: Model, chiSquares: Float64Array): number[] {
  if (widths.length < 2) return localMinima(grid.axes, chiSquares).slice(0, trial.starts);
  const nodes: number[] = [];
  for (const node of localMinima(grid.axes, chiSquares, widths)) {
    if (nodes.length === trial.starts) break;
    if (!nodes.some((better) => areNeighbours(grid.axes, node, better))) nodes.push(node);
  }
  return nodes;
}

/**
 * Local minima of the lattice (no better neighbour, diagonal ones included), best first. Nodes that differ along an axis that is
 * kept apart do not count as neighbours.
 */
export function localMinima(
  axes: readonly Float64Array[],
  chiSquares: Float64Array,
  apart: readonly number[] = [],
): number[] {
  const minima: number[] = [];
  for (let node = 0; node < chiSquares.length; node++) {
    if (isLowest(axes, chiSquares, apart, node)) minima.push(node);
  }
  return minima.sort((a, b) => chiSquares[a]! - chiSquares[b]!);
}

/** Neighbours along one axis rule most nodes out before the diagonal ones are looked at. */
function isLowest(
  axes: readonly Float64Array[],
  chiSquares: Float64Array,
  apart: readonly number[],
  node: number,
): boolean {
  let stride = 1;
  for (let k = 0; k < axes.length; k++) {
    const { length } = axes[k]!;
    if (!apart.includes(k)) {
      const place = Math.floor(node / stride) % length;
      if (place > 0 && isBelow(chiSquares, node - stride, node)) return false;
      if (place < length - 1 && isBelow(chiSquares, node + stride, node)) return false;
    }
    stride *= length;
  }
  return noneBelow(axes, chiSquares, apart, node, node, 0, 1);
}

/** Whether no neighbour of a node lies lower, diagonal ones included: those reached from `from` over the axes from k on. */
function noneBelow(
  axes: readonly Float64Array[],
  chiSquares: Float64Array,
  apart: readonly number[],
  node: number,
  from: number,
  k: number,
  stride: number,
): boolean {
  if (k === axes.length) return !isBelow(chiSquares, from, node);
  const { length } = axes[k]!;
  const place = Math.floor(node / stride) % length;
  const next = stride * length;
  if (!noneBelow(axes, chiSquares, apart, node, from, k + 1, next)) return false;
  if (apart.includes(k)) return true;
  return (
    (place === 0 || noneBelow(axes, chiSquares, apart, node, from - stride, k + 1, next)) &&
    (place === length - 1 || noneBelow(axes, chiSquares, apart, node, from + stride, k + 1, next))
  );
}

/** Whether two nodes are no more than one place apart along every axis. */
export function areNeighbours(axes: readonly Float64Array[], a: number, b: number): boolean {
  let stride = 1;
  for (const { length } of axes) {
    const apart = (Math.floor(a / stride) % length) - (Math.floor(b / stride) % length);
    if (Math.abs(apart) > 1) return false;
    stride *= length;
  }
  return true;
}

/** A plateau counts once, at its first node. */
function isBelow(chiSquares: Float64Array, other: number, node: number): boolean {
  const there = chiSquares[other]!;
  const here = chiSquares[node]!;
  return there < here || (there === here && other < node);
}

/** Whether θ lies between the lattice neighbours of a node, so that the node belongs to the valley that θ is the bottom of. */
export function inValleyOf({ grid }: Model, node: number, theta: Float64Array): boolean {
  let stride = 1;
  for (let k = 0; k < grid.axes.length; k++) {
    const axis = grid.axes[k]!;
    const place = Math.floor(node / stride) % axis.length;
    if (place > 0 && theta[k]! < axis[place - 1]!) return false;
    if (place < axis.length - 1 && theta[k]! > axis[place + 1]!) return false;
    stride *= axis.length;
  }
  return true;
}

/** Shape of a node into θ, everything else neutral. */
export function thetaOfNode(
  { grid }: Model,
  node: number,
  neutral: Float64Array,
  theta: Float64Array,
): void {
  theta.set(neutral);
  shapeOfNode(grid.axes, node, theta);
}
