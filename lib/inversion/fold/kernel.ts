import type { StoppingProfile } from '../types';

/**
 * Stopping profiles that share one grid of bin edges, laid out for folding. Row r, edge j of B + 1:
 * density[r(B+1)+j] muon share per nm in the bin that begins at edge j (0 for the last edge);
 * jump = density of the bin before minus that of the bin after (so that Σ_b ρ_b (G(r_b) − G(l_b)) = Σ_j jump_j G(x_j));
 * tail = share stopped deeper than edge j.
 */
export interface KernelGroup {
  edgesNm: Float64Array;
  /** Which rows of the kernel the profiles of this group are. */
  rows: Int32Array;
  density: Float64Array;
  jump: Float64Array;
  tail: Float64Array;
  /** Edges from firstJump[r] to before endJump[r] hold all jumps of row r that a share can show. */
  firstJump: Int32Array;
  endJump: Int32Array;
}

export interface Kernel {
  rowCount: number;
  groups: readonly KernelGroup[];
  /** Edges of the largest group: the size that a scratch array needs. */
  largestEdgeCount: number;
}

export function compileKernel(profiles: readonly StoppingProfile[]): Kernel {
  const members: { edgesNm: Float64Array; rows: number[] }[] = [];
  profiles.forEach((profile, row) => {
    const group = members.find(({ edgesNm }) => sameEdges(edgesNm, profile.edgesNm));
    if (group) group.rows.push(row);
    else members.push({ edgesNm: profile.edgesNm, rows: [row] });
  });
  return {
    rowCount: profiles.length,
    groups: members.map(({ edgesNm, rows }) => compileGroup(edgesNm, rows, profiles)),
    largestEdgeCount: Math.max(...members.map(({ edgesNm }) => edgesNm.length)),
  };
}

function sameEdges(a: Float64Array, b: Float64Array): boolean {
  if (a === b) return true;
  if (a.length !== b.length) return false;
  for (let j = 0; j < a.length; j++) if (a[j] !== b[j]) return false;
  return true;
}

function compileGroup(
  edgesNm: Float64Array,
  rows: number[],
  profiles: readonly StoppingProfile[],
): KernelGroup {
  const edgeCount = edgesNm.length;
  const density = new Float64Array(rows.length * edgeCount);
  const jump = new Float64Array(rows.length * edgeCount);
  const tail = new Float64Array(rows.length * edgeCount);
  rows.forEach((row, r) => {
    const { mass } = profiles[row]!;
    const at = r * edgeCount;
    for (let b = 0; b < mass.length; b++)
      density[at + b] = mass[b]! / (edgesNm[b + 1]! - edgesNm[b]!);
    for (let j = 0; j < edgeCount; j++)
      jump[at + j] = (j === 0 ? 0 : density[at + j - 1]!) - density[at + j]!;
    for (let j = edgeCount - 2; j >= 0; j--) tail[at + j] = tail[at + j + 1]! + mass[j]!;
  });
  return {
    edgesNm,
    rows: Int32Array.from(rows),
    density,
    jump,
    tail,
    ...jumpRanges(edgesNm, jump),
  };
}

/** A jump of less than this share per range, summed over as many edges as there may be, is below the last bit of a share. */
const SMALLEST_JUMP = 1e-20;

/** Muons stop over a part of the bins only: the rest of the jumps is zero, or as good as. */
export function jumpRanges(
  edgesNm: Float64Array,
  jump: Float64Array,
): Pick<KernelGroup, 'firstJump' | 'endJump'> {
  const edgeCount = edgesNm.length;
  const rowCount = jump.length / edgeCount;
  const smallest = SMALLEST_JUMP / (edgesNm[edgeCount - 1]! - edgesNm[0]!);
  const firstJump = new Int32Array(rowCount);
  const endJump = new Int32Array(rowCount);
  for (let r = 0; r < rowCount; r++) {
    const at = r * edgeCount;
    let first = 0;
    let end = edgeCount;
    while (first < end && Math.abs(jump[at + first]!) < smallest) first++;
    while (end > first && Math.abs(jump[at + end - 1]!) < smallest) end--;
    firstJump[r] = first;
    endJump[r] = end;
  }
  return { firstJump, endJump };
}

/** Index of the first edge that lies at or beyond xNm; the number of edges when none does. */
export function firstEdgeAtOrBeyond(edgesNm: Float64Array, xNm: number): number {
  let low = 0;
  let high = edgesNm.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (edgesNm[middle]! < xNm) low = middle + 1;
    else high = middle;
  }
  return low;
}
