import { NORMAL_REACH, normalInto } from '../statistics/normal-table';
import { firstEdgeAtOrBeyond, type Kernel, type KernelGroup } from './kernel';

/** Folds of one edge, one number per row of the kernel: the populated share and its derivatives. */
export interface EdgeFold {
  share: Float64Array;
  byEdge: Float64Array;
  byWidth: Float64Array;
  byStart: Float64Array;
}

export interface FoldScratch {
  g: Float64Array;
  normal: Float64Array;
}

export function createEdgeFold(rowCount: number): EdgeFold {
  return {
    share: new Float64Array(rowCount),
    byEdge: new Float64Array(rowCount),
    byWidth: new Float64Array(rowCount),
    byStart: new Float64Array(rowCount),
  };
}

export function createFoldScratch(kernel: Kernel): FoldScratch {
  return {
    g: new Float64Array(kernel.largestEdgeCount),
    normal: new Float64Array(2 * kernel.largestEdgeCount + 4),
  };
}

/**
 * S_i = ∫ ρ_i(x) s(x) dx from startNm on, with s(x) = ½ erfc((u − x)/(√2 v)) (a step where v = 0) and ρ_i uniform in
 * each bin, all in the depths of the stopping file. Exact: with G(x) = (x − u)Φ(t) + vφ(t), t = (x − u)/v (the integral
 * of s), S_i = Σ_j (ρ_{j−1} − ρ_j) G(x_j). Where t ≥ NORMAL_REACH, G(x) = x − u and the sum is known:
 * tail + ρ·(x − u); where t ≤ −NORMAL_REACH, G = 0. So Φ is only needed near the edge.
 * Derivatives: ∂G/∂u = −Φ, ∂G/∂v = φ, ∂S/∂start = −ρ(start) s(start). startNm must not lie beyond u.
 */
export function foldEdge(
  kernel: Kernel,
  edgeNm: number,
  widthNm: number,
  startNm: number,
  scratch: FoldScratch,
  out: EdgeFold,
): void {
  for (const group of kernel.groups) foldGroup(group, edgeNm, widthNm, startNm, scratch, out);
}

function foldGroup(
  group: KernelGroup,
  u: number,
  v: number,
  startNm: number,
  scratch: FoldScratch,
  out: EdgeFold,
): void {
  const { edgesNm, rows, density, jump, tail } = group;
  const { g, normal } = scratch;
  const edgeCount = edgesNm.length;
  const reach = NORMAL_REACH * v;
  const cut = startNm > edgesNm[0]!;
  const afterStart = cut ? firstEdgeAtOrBeyond(edgesNm, startNm) : 0;
  const from = Math.max(firstEdgeAtOrBeyond(edgesNm, u - reach), afterStart);
  const to = Math.max(firstEdgeAtOrBeyond(edgesNm, u + reach), from);
  for (let j = from; j < to; j++) {
    const x = edgesNm[j]! - u;
    normalInto(x / v, normal, 2 * j);
    g[j] = x * normal[2 * j]! + v * normal[2 * j + 1]!;
  }
  // The partial bin that begins at startNm: its left end enters with the density of the bin.
  let gStart = 0;
  let sStart = 0;
  let pStart = 0;
  const startBin = cut && afterStart < edgeCount ? afterStart - 1 : -1;
  if (startBin >= 0) {
    // A step (v = 0) at the start itself belongs to the edge, so it adds nothing here.
    const x = startNm - u;
    normalInto(v > 0 ? x / v : -Infinity, normal, 2 * edgeCount);
    sStart = normal[2 * edgeCount]!;
    pStart = normal[2 * edgeCount + 1]!;
    gStart = x * sStart + v * pStart;
  }
  const past = to < edgeCount ? edgesNm[to]! - u : 0;
  for (let r = 0; r < rows.length; r++) {
    const at = r * edgeCount;
    let share = 0;
    let phi = 0;
    let pdf = 0;
    for (let j = from; j < to; j++) {
      const d = jump[at + j]!;
      share += d * g[j]!;
      phi += d * normal[2 * j]!;
      pdf += d * normal[2 * j + 1]!;
    }
    if (to < edgeCount && to > 0) {
      const before = density[at + to - 1]!;
      share += tail[at + to]! + before * past;
      phi += before;
    } else if (to === 0) share += tail[at]!;
    const row = rows[r]!;
    let byStart = 0;
    if (startBin >= 0) {
      const rho = density[at + startBin]!;
      share -= rho * gStart;
      phi -= rho * sStart;
      pdf -= rho * pStart;
      byStart = -rho * sStart;
    }
    out.share[row] = share;
    out.byEdge[row] = -phi;
    out.byWidth[row] = pdf;
    out.byStart[row] = byStart;
  }
}

/** Share stopped before startNm (the cap) and its derivative, the density there. */
export function foldStart(
  kernel: Kernel,
  startNm: number,
  share: Float64Array,
  byStart: Float64Array,
): void {
  for (const { edgesNm, rows, density, tail } of kernel.groups) {
    const edgeCount = edgesNm.length;
    const next = firstEdgeAtOrBeyond(edgesNm, startNm);
    for (let r = 0; r < rows.length; r++) {
      const at = r * edgeCount;
      const row = rows[r]!;
      if (next === 0 || next === edgeCount) {
        share[row] = next === 0 ? 0 : 1;
        byStart[row] = 0;
      } else {
        const rho = density[at + next - 1]!;
        share[row] = 1 - tail[at + next]! - rho * (edgesNm[next]! - startNm);
        byStart[row] = rho;
      }
    }
  }
}
