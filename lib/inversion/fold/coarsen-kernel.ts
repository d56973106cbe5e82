import { jumpRanges, type Kernel, type KernelGroup } from './kernel';

/**
 * The same stopping profiles on fewer, wider bins: for a search that only has to find the right valley. Bins are merged in
 * equal numbers from the first edge to the last that still closes a bin with stops in it; masses are kept.
 */
export function coarsenKernel(kernel: Kernel, mostBins: number): Kernel {
  const groups = kernel.groups.map((group) => coarsenGroup(group, mostBins));
  return {
    rowCount: kernel.rowCount,
    groups,
    largestEdgeCount: Math.max(...groups.map(({ edgesNm }) => edgesNm.length)),
  };
}

function coarsenGroup(group: KernelGroup, mostBins: number): KernelGroup {
  const { edgesNm, rows, tail } = group;
  const edgeCount = edgesNm.length;
  let bins = edgeCount - 1;
  while (bins > 1 && rows.every((_, r) => tail[r * edgeCount + bins - 1] === 0)) bins--;
  const coarse = Math.min(bins, mostBins);
  const kept = Int32Array.from({ length: coarse + 1 }, (_, k) => Math.round((k * bins) / coarse));
  const count = kept.length;
  const density = new Float64Array(rows.length * count);
  const jump = new Float64Array(rows.length * count);
  const coarseTail = new Float64Array(rows.length * count);
  for (let r = 0; r < rows.length; r++) {
    const at = r * count;
    for (let k = 0; k < count; k++) coarseTail[at + k] = tail[r * edgeCount + kept[k]!]!;
    for (let k = 0; k < count; k++) {
      const before = k === 0 ? 0 : density[at + k - 1]!;
      if (k < count - 1) {
        density[at + k] =
          (coarseTail[at + k]! - coarseTail[at + k + 1]!) /
          (edgesNm[kept[k + 1]!]! - edgesNm[kept[k]!]!);
      }
      jump[at + k] = before - density[at + k]!;
    }
  }
  const coarseEdges = Float64Array.from(kept, (j) => edgesNm[j]!);
  return {
    edgesNm: coarseEdges,
    rows,
    density,
    jump,
    tail: coarseTail,
    ...jumpRanges(coarseEdges, jump),
  };
}
