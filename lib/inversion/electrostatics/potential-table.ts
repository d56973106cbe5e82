import { GAUSS_NODES, GAUSS_WEIGHTS } from '../statistics/gauss-legendre';
import { majorityTerm, minorityTerm, reducedCharge, spaceChargeFunction } from './space-charge';

/**
 * The curve v(ξ) from the surface into the bulk at nodes, in reduced units (v = φ/kT, ξ = x/L_D): y = ln|v| and the
 * cumulative majority share m(ξ) = ∫₀^ξ e^(−v) dξ, each with its first two derivatives by ξ.
 */
export interface PotentialTable {
  nodeCount: number;
  depth: Float64Array;
  log: Float64Array;
  logSlope: Float64Array;
  logCurvature: Float64Array;
  share: Float64Array;
  shareSlope: Float64Array;
  shareCurvature: Float64Array;
}

/** Panels are at most this wide in v and in ln|v|: the terms of F change over |Δv| of 1 to 2, its tail over Δln|v| of 1. */
const WIDEST_PANEL = 0.125;
/** Below this |v| the tail is an exponential to the last digit: the next term is of order v. */
export const TAIL_BELOW = 1e-9;
/**
 * Depth by quadrature of the first integral: ξ(v) = ∫ |v|/(√2 F(v)) d ln|v| from v up to v_s, whose integrand is smooth
 * from strong inversion to the exponential tail (Kingston and Neustadter 1955, section III). |v_s| must exceed TAIL_BELOW.
 */
export function potentialTable(surface: number, fermi: number): PotentialTable {
  const logs = panelEnds(Math.abs(surface));
  const table = emptyTable(logs.length);
  const sign = Math.sign(surface);
  let depth = 0;
  let share = 0;
  for (let k = 0; k < logs.length; k++) {
    if (k > 0) {
      const middle = (logs[k - 1]! + logs[k]!) / 2;
      const half = (logs[k - 1]! - logs[k]!) / 2;
      for (let g = 0; g < GAUSS_NODES.length; g++) {
        const v = sign * Math.exp(middle + half * GAUSS_NODES[g]!);
        const step =
          (GAUSS_WEIGHTS[g]! * half * Math.abs(v)) / (Math.SQRT2 * spaceChargeFunction(v, fermi));
        depth += step;
        share += step * Math.exp(-v);
      }
    }
    fillNode(table, k, { v: sign * Math.exp(logs[k]!), log: logs[k]!, depth, share, fermi });
  }
  return table;
}

/** ln|v| from ln|v_s| down to the tail. */
function panelEnds(surfaceMagnitude: number): number[] {
  const ends = [Math.log(surfaceMagnitude)];
  let v = surfaceMagnitude;
  while (v > TAIL_BELOW) {
    v =
      v > 1 ? Math.max(v - WIDEST_PANEL, v * Math.exp(-WIDEST_PANEL)) : v * Math.exp(-WIDEST_PANEL);
    ends.push(Math.log(v));
  }
  return ends;
}

function fillNode(
  table: PotentialTable,
  k: number,
  at: { v: number; log: number; depth: number; share: number; fermi: number },
): void {
  const { v, fermi } = at;
  // (dv/dξ)² = 2F² from the first integral and v″ from Poisson's equation itself.
  const squared = 2 * (majorityTerm(v) + minorityTerm(v, fermi));
  const slope = -Math.sign(v) * Math.sqrt(squared);
  table.depth[k] = at.depth;
  table.log[k] = at.log;
  table.logSlope[k] = slope / v;
  table.logCurvature[k] = reducedCharge(v, fermi) / v - squared / (v * v);
  table.share[k] = at.share;
  table.shareSlope[k] = Math.exp(-v);
  table.shareCurvature[k] = -slope * Math.exp(-v);
}

function emptyTable(nodeCount: number): PotentialTable {
  const column = () => new Float64Array(nodeCount);
  return {
    nodeCount,
    depth: column(),
    log: column(),
    logSlope: column(),
    logCurvature: column(),
    share: column(),
    shareSlope: column(),
    shareCurvature: column(),
  };
}
