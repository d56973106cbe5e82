import { GAUSS_NODES, GAUSS_WEIGHTS } from '../statistics/gauss-legendre';
import { potentialTable, TAIL_BELOW, type PotentialTable } from './potential-table';
import { quinticHermite } from './quintic-hermite';
import { spaceChargeFunction } from './space-charge';

/** The band bending below a surface in reduced units: v = φ/kT over ξ = x/L_D. */
export interface ReducedCurve {
  /** v at depth ξ. */
  potential(depth: number): number;
  /** ∫₀^ξ e^(−v) dξ. */
  share(depth: number): number;
  /** ξ at which v is reached; v lies between the surface and the bulk, with the sign of the surface. */
  depthOf(v: number): number;
}

/** Solution of v″ = (1 − e^(−v)) + r(e^v − 1) with v(0) = surface, v(∞) = 0, r = e^(−2·fermi). */
export function reducedCurve(surface: number, fermi: number): ReducedCurve {
  const decay = Math.sqrt(1 + Math.exp(-2 * fermi));
  if (Math.abs(surface) <= TAIL_BELOW) return tail(surface, decay, 0, 0);
  const table = potentialTable(surface, fermi);
  const last = table.nodeCount - 1;
  const sign = Math.sign(surface);
  const end = table.depth[last]!;
  const beyond = tail(sign * Math.exp(table.log[last]!), decay, end, table.share[last]!);
  return {
    potential: (depth) =>
      depth >= end ? beyond.potential(depth) : sign * Math.exp(interpolate(table, depth, 'log')),
    share: (depth) => (depth >= end ? beyond.share(depth) : interpolate(table, depth, 'share')),
    depthOf: (v) =>
      Math.log(Math.abs(v)) <= table.log[last]! ? beyond.depthOf(v) : depthInTable(table, v, fermi),
  };
}

/** v = v₀·e^(−√(1 + r)(ξ − ξ₀)) where |v| is small, and m = m₀ + (ξ − ξ₀) − ∫v. */
function tail(v0: number, decay: number, from: number, share: number): ReducedCurve {
  return {
    potential: (depth) => v0 * Math.exp(-decay * (depth - from)),
    share: (depth) => share + (depth - from) + (v0 * Math.expm1(-decay * (depth - from))) / decay,
    depthOf: (v) => from + Math.log(v0 / v) / decay,
  };
}

/** Quadrature of the first integral from the node above. */
function depthInTable(table: PotentialTable, v: number, fermi: number): number {
  const log = Math.log(Math.abs(v));
  const k = panelOf(table.log, log, -1);
  const middle = (table.log[k]! + log) / 2;
  const half = (table.log[k]! - log) / 2;
  let depth = table.depth[k]!;
  for (let g = 0; g < GAUSS_NODES.length; g++) {
    const at = Math.sign(v) * Math.exp(middle + half * GAUSS_NODES[g]!);
    depth +=
      (GAUSS_WEIGHTS[g]! * half * Math.abs(at)) / (Math.SQRT2 * spaceChargeFunction(at, fermi));
  }
  return depth;
}

function interpolate(table: PotentialTable, depth: number, column: 'log' | 'share'): number {
  const k = panelOf(table.depth, depth, 1);
  const width = table.depth[k + 1]! - table.depth[k]!;
  const values = table[column];
  const slopes = column === 'log' ? table.logSlope : table.shareSlope;
  const curvatures = column === 'log' ? table.logCurvature : table.shareCurvature;
  return quinticHermite(
    (depth - table.depth[k]!) / width,
    width,
    values[k]!,
    slopes[k]!,
    curvatures[k]!,
    values[k + 1]!,
    slopes[k + 1]!,
    curvatures[k + 1]!,
  );
}

/** Panel of nodes, ascending (1) or descending (−1), that holds a value between the first and the last. */
function panelOf(nodes: Float64Array, value: number, order: 1 | -1): number {
  let low = 0;
  let high = nodes.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (order * nodes[middle]! <= order * value) low = middle;
    else high = middle;
  }
  return low;
}
