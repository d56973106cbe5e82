import type { Kernel, KernelGroup } from './kernel';
import type { CumulativeScratch, ShareFold } from './share-fold';

export function createCumulativeScratch(
  { largestEdgeCount }: Kernel,
  shapeCount: number,
): CumulativeScratch {
  const array = (): Float64Array => new Float64Array(largestEdgeCount);
  return {
    depthsNm: array(),
    integral: array(),
    share: array(),
    byShape: Array.from({ length: shapeCount }, array),
  };
}

/** Writes M, s and ∂M/∂shape_k at the depths from first on; they ascend and are above 0. */
export type Cumulate = (
  scratch: CumulativeScratch,
  first: number,
  count: number,
  derivatives: boolean,
) => void;

/**
 * S_i = ∫ ρ_i s dx of any profile from its cumulative share: ρ_i is uniform in each bin, so with bin edges e_j of the file at
 * depths x_j = a·e_j − d below the cap S_i = (1/a) Σ_j (ρ_{i,j−1} − ρ_{i,j}) M(x_j), exactly. ∂S/∂a follows from
 * ∂x_j/∂a = e_j.
 */
export function foldCumulative(
  kernel: Kernel,
  capNm: number,
  scale: number,
  out: ShareFold,
  cumulate: Cumulate,
): void {
  for (const group of kernel.groups) {
    const count = group.edgesNm.length;
    const { depthsNm, integral, share, byShape } = out.cumulative;
    let first = 0;
    for (let j = 0; j < count; j++) {
      depthsNm[j] = scale * group.edgesNm[j]! - capNm;
      if (depthsNm[j]! > 0) continue;
      first = j + 1;
      integral[j] = share[j] = 0;
      for (const column of byShape) column[j] = 0;
    }
    cumulate(out.cumulative, first, count, out.derivatives);
    sumGroup(group, first, scale, out);
  }
}

function sumGroup(
  { edgesNm, rows, jump, firstJump, endJump }: KernelGroup,
  first: number,
  scale: number,
  { share, byShape, byScale, derivatives, cumulative }: ShareFold,
): void {
  const count = edgesNm.length;
  for (let r = 0; r < rows.length; r++) {
    const at = r * count;
    const row = rows[r]!;
    const begin = Math.max(first, firstJump[r]!);
    const end = endJump[r]!;
    const sum = dot(jump, at, cumulative.integral, begin, end) / scale;
    share[row] = sum;
    if (!derivatives) continue;
    for (let k = 0; k < byShape.length; k++)
      byShape[k]![row] = dot(jump, at, cumulative.byShape[k]!, begin, end) / scale;
    let stretched = 0;
    for (let j = begin; j < end; j++)
      stretched += jump[at + j]! * cumulative.share[j]! * edgesNm[j]!;
    byScale[row] = (stretched - sum) / scale;
  }
}

function dot(
  jump: Float64Array,
  at: number,
  column: Float64Array,
  first: number,
  end: number,
): number {
  let sum = 0;
  for (let j = first; j < end; j++) sum += jump[at + j]! * column[j]!;
  return sum;
}
