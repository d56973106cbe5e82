import { NORMAL_REACH, normalInto } from '../statistics/normal-table';
import { firstEdgeAtOrBeyond, type Kernel, type KernelGroup } from './kernel';

/** Folds of one edge, one number per row of the kernel: the populated share and its derivatives. */
export interface EdgeFold {
  /** False leaves the derivatives alone and halves the work. */
  derivatives: boolean;
  share: Float64Array;
  byEdge: Float64Array;
  byWidth: Float64Array;
  byStart: Float64Array;
}

/** G, Φ and φ at the edges of one group; the last place belongs to the start. */
export interface FoldScratch {
  g: Float64Array;
  cdf: Float64Array;
  pdf: Float64Array;
}

export function createEdgeFold(rowCount: number): EdgeFold {
  return {
    derivatives: true,
    share: new Float64Array(rowCount),
    byEdge: new Float64Array(rowCount),
    byWidth: new Float64Array(rowCount),
    byStart: new Float64Array(rowCount),
  };
}

export function createFoldScratch({ largestEdgeCount }: Kernel): FoldScratch {
  const array = (): Float64Array => new Float64Array(largestEdgeCount + 1);
  return { g: array(), cdf: array(), pdf: array() };
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
  const { edgesNm, rows } = group;
  const edgeCount = edgesNm.length;
  const reach = NORMAL_REACH * v;
  const cut = startNm > edgesNm[0]!;
  const afterStart = cut ? firstEdgeAtOrBeyond(edgesNm, startNm) : 0;
  const from = Math.max(firstEdgeAtOrBeyond(edgesNm, u - reach), afterStart);
  const to = Math.max(firstEdgeAtOrBeyond(edgesNm, u + reach), from);
  fillEdgeTerms(edgesNm, from, to, u, v, scratch);
  if (out.derivatives) sumPairs(group, from, to, scratch, out);
  else sumShares(group, from, to, scratch, out);
  addTails(group, to, to < edgeCount ? edgesNm[to]! - u : 0, out);
  const startBin = cut && afterStart < edgeCount ? afterStart - 1 : -1;
  if (startBin >= 0) subtractStart(group, startBin, startNm - u, v, scratch, out);
  else for (let r = 0; r < rows.length; r++) out.byStart[rows[r]!] = 0;
}

function fillEdgeTerms(
  edgesNm: Float64Array,
  from: number,
  to: number,
  u: number,
  v: number,
  { g, cdf, pdf }: FoldScratch,
): void {
  const perWidth = 1 / v;
  for (let j = from; j < to; j++) {
    const x = edgesNm[j]! - u;
    normalInto(x * perWidth, cdf, pdf, j);
    g[j] = x * cdf[j]! + v * pdf[j]!;
  }
}

/** Σ_j jump_j (G_j, Φ_j, φ_j) over the edges near the edge, two rows at a time: each term is then loaded once for both. */
function sumPairs(
  { edgesNm, rows, jump, firstJump, endJump }: KernelGroup,
  from: number,
  to: number,
  { g, cdf, pdf }: FoldScratch,
  out: EdgeFold,
): void {
  const edgeCount = edgesNm.length;
  for (let r = 0; r < rows.length; r += 2) {
    const paired = r + 1 < rows.length;
    const other = paired ? r + 1 : r;
    const first = r * edgeCount;
    const second = other * edgeCount;
    const begin = Math.max(from, Math.min(firstJump[r]!, firstJump[other]!));
    const end = Math.min(to, Math.max(endJump[r]!, endJump[other]!));
    let share0 = 0;
    let cdf0 = 0;
    let pdf0 = 0;
    let share1 = 0;
    let cdf1 = 0;
    let pdf1 = 0;
    for (let j = begin; j < end; j++) {
      const d0 = jump[first + j]!;
      const d1 = jump[second + j]!;
      const gj = g[j]!;
      const cj = cdf[j]!;
      const pj = pdf[j]!;
      share0 += d0 * gj;
      cdf0 += d0 * cj;
      pdf0 += d0 * pj;
      share1 += d1 * gj;
      cdf1 += d1 * cj;
      pdf1 += d1 * pj;
    }
    store(out, rows[r]!, share0, cdf0, pdf0);
    if (paired) store(out, rows[r + 1]!, share1, cdf1, pdf1);
  }
}

/** Σ_j jump_j G_j alone. */
function sumShares(
  { edgesNm, rows, jump, firstJump, endJump }: KernelGroup,
  from: number,
  to: number,
  { g }: FoldScratch,
  out: EdgeFold,
): void {
  const edgeCount = edgesNm.length;
  for (let r = 0; r < rows.length; r += 2) {
    const paired = r + 1 < rows.length;
    const other = paired ? r + 1 : r;
    const first = r * edgeCount;
    const second = other * edgeCount;
    const begin = Math.max(from, Math.min(firstJump[r]!, firstJump[other]!));
    const end = Math.min(to, Math.max(endJump[r]!, endJump[other]!));
    let share0 = 0;
    let share1 = 0;
    for (let j = begin; j < end; j++) {
      const gj = g[j]!;
      share0 += jump[first + j]! * gj;
      share1 += jump[second + j]! * gj;
    }
    store(out, rows[r]!, share0, 0, 0);
    if (paired) store(out, rows[r + 1]!, share1, 0, 0);
  }
}

function store(out: EdgeFold, row: number, share: number, cdf: number, pdf: number): void {
  out.share[row] = share;
  out.byEdge[row] = -cdf;
  out.byWidth[row] = pdf;
}

/** Edges from `to` on lie where s = 1: their sum is the tail and the rest of the bin before, `past` nm beyond the edge. */
function addTails(
  { edgesNm, rows, density, tail }: KernelGroup,
  to: number,
  past: number,
  out: EdgeFold,
): void {
  const edgeCount = edgesNm.length;
  if (to === edgeCount) return;
  for (let r = 0; r < rows.length; r++) {
    const row = rows[r]!;
    const before = to === 0 ? 0 : density[r * edgeCount + to - 1]!;
    out.share[row] = out.share[row]! + tail[r * edgeCount + to]! + before * past;
    out.byEdge[row] = out.byEdge[row]! - before;
  }
}

/** The bin that the start cuts: its left end enters with the density of the bin. A step at the start itself is the edge's. */
function subtractStart(
  { edgesNm, rows, density }: KernelGroup,
  startBin: number,
  x: number,
  v: number,
  { g, cdf, pdf }: FoldScratch,
  out: EdgeFold,
): void {
  const last = g.length - 1;
  normalInto(v > 0 ? x / v : -Infinity, cdf, pdf, last);
  const sStart = cdf[last]!;
  const pStart = pdf[last]!;
  const gStart = x * sStart + v * pStart;
  for (let r = 0; r < rows.length; r++) {
    const row = rows[r]!;
    const rho = density[r * edgesNm.length + startBin]!;
    out.share[row] = out.share[row]! - rho * gStart;
    out.byEdge[row] = out.byEdge[row]! + rho * sStart;
    out.byWidth[row] = out.byWidth[row]! - rho * pStart;
    out.byStart[row] = -rho * sStart;
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
