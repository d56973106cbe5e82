import { coarsenKernel } from '../fold/coarsen-kernel';
import { foldStart } from '../fold/fold-edge';
import type { Kernel } from '../fold/kernel';
import type { TrialProfile } from '../profile/trial-profile';
import type { SearchGrid } from './model';
import { createShareFold } from './workspace';

/** Depth nodes of a graded edge; an edge moves the fold on the scale of the straggling, so tens of nodes find every valley. */
const GRADED_DEPTHS = 28;
/** Widths tried, as shares of the depth range: a step, then log-spaced. */
const WIDTH_SHARES = [0, 0.012, 0.035, 0.09, 0.22, 0.5];
/** A sharp edge has one shape parameter only and cheap folds: the lattice may be fine. */
const SHARP_DEPTHS = 192;
/** Bins of the stopping profiles that a graded edge is searched with. A sharp edge takes no more time on the bins of the file. */
const GRADED_BINS = 80;

export interface GridInput {
  kernel: Kernel;
  trial: TrialProfile;
  capNm: number;
  /** Neutral depth scale. */
  scale: number;
  /** Held depth and width, or null. */
  heldDepthNm: number | null;
  heldWidthNm: number | null;
  deepestNm: number;
  /** Rows that are used: they say where the stops are. */
  enabled: Uint8Array;
}

/** Folds on the search lattice. Nodes lie denser where more muons stop: at equal steps of half depth, half mean cumulative stopping. */
export function buildSearchGrid(input: GridInput): SearchGrid {
  const { trial, capNm, scale } = input;
  const kernel = trial.kinked ? input.kernel : coarsenKernel(input.kernel, GRADED_BINS);
  const depths =
    input.heldDepthNm === null
      ? blendedDepths(input, trial.kinked ? SHARP_DEPTHS : GRADED_DEPTHS)
      : [input.heldDepthNm];
  const widths = trial.shapeNames.length < 2 ? [0] : searchWidths(input);
  const shapeCount = trial.shapeNames.length;
  const nodeCount = widths.length * depths.length;
  const shapes = new Float64Array(nodeCount * shapeCount);
  const shares = new Float64Array(nodeCount * kernel.rowCount);
  const capShares = new Float64Array(kernel.rowCount);
  if (capNm > 0)
    foldStart(input.kernel, capNm / scale, capShares, new Float64Array(kernel.rowCount));
  const fold = createShareFold({ rowCount: kernel.rowCount, kernel, shapeCount });
  fold.edge.derivatives = false;
  let node = 0;
  for (const width of widths) {
    for (const depth of depths) {
      const shape = shapes.subarray(node * shapeCount, (node + 1) * shapeCount);
      shape[0] = depth;
      if (shapeCount > 1) shape[1] = width;
      trial.fold(kernel, shape, capNm, scale, fold);
      shares.set(fold.share, node * kernel.rowCount);
      node++;
    }
  }
  return { nodeCount, shapes, shares, capShares, lattice: [widths.length, depths.length] };
}

function searchWidths({ heldWidthNm, deepestNm }: GridInput): number[] {
  return heldWidthNm === null ? WIDTH_SHARES.map((share) => share * deepestNm) : [heldWidthNm];
}

function blendedDepths(
  { kernel, capNm, scale, deepestNm, enabled }: GridInput,
  count: number,
): number[] {
  const fine = 128;
  const blend = new Float64Array(fine + 1);
  const share = new Float64Array(kernel.rowCount);
  const density = new Float64Array(kernel.rowCount);
  for (let k = 0; k <= fine; k++) {
    foldStart(kernel, (capNm + (deepestNm * k) / fine) / scale, share, density);
    let sum = 0;
    let used = 0;
    for (let i = 0; i < share.length; i++) {
      if (!enabled[i]) continue;
      sum += share[i]!;
      used++;
    }
    blend[k] = sum / used + k / fine;
  }
  const depths: number[] = [];
  let k = 0;
  for (let node = 0; node < count; node++) {
    const goal = blend[0]! + ((blend[fine]! - blend[0]!) * node) / (count - 1);
    while (k < fine - 1 && blend[k + 1]! < goal) k++;
    const t = Math.min(1, Math.max(0, (goal - blend[k]!) / (blend[k + 1]! - blend[k]!)));
    depths.push((deepestNm * (k + t)) / fine);
  }
  return depths;
}
