import { coarsenKernel } from '../fold/coarsen-kernel';
import { foldStart } from '../fold/fold-edge';
import type { Kernel } from '../fold/kernel';
import { whiten, type Whitener } from '../linalg/whitener';
import type { TrialProfile } from '../profile/trial-profile';
import type { SearchGrid } from './model';
import { createShareFold } from './workspace';

/** Bins of the stopping profiles that a smooth profile is searched with. A sharp edge takes no more time on the bins of the file. */
const COARSE_BINS = 56;

export interface LatticeInput {
  kernel: Kernel;
  trial: TrialProfile;
  capNm: number;
  /** Neutral depth scale. */
  scale: number;
  /** Held value of each shape parameter, or null. */
  heldShape: readonly (number | null)[];
  deepestNm: number;
}

export interface LevelWeights {
  whitener: Whitener;
  unit: Float64Array;
  /** 1/σ of the priors of the levels. */
  levelPriors: Float64Array;
}

/** Folds of the lattice before any uncertainty counts. */
export interface LatticeFolds {
  axes: readonly Float64Array[];
  /** S, row-major by node. */
  shares: Float64Array;
  /** q */
  capShare: Float64Array;
}

export function foldLattice(input: LatticeInput): LatticeFolds {
  const { trial, capNm, scale } = input;
  const { rowCount } = input.kernel;
  const kernel = trial.kinked ? input.kernel : coarsenKernel(input.kernel, COARSE_BINS);
  const axes = trial
    .searchAxes({
      deepestNm: input.deepestNm,
      held: input.heldShape.map((value) => value !== null),
      depths: (count) => blendedDepths(input, count),
    })
    .map((axis, k) => {
      const held = input.heldShape[k] ?? null;
      return held === null ? axis : Float64Array.of(held);
    });
  const nodeCount = axes.reduce((product, axis) => product * axis.length, 1);
  const shares = new Float64Array(nodeCount * rowCount);
  const capShare = new Float64Array(rowCount);
  if (capNm > 0) foldStart(input.kernel, capNm / scale, capShare, new Float64Array(rowCount));
  const fold = createShareFold({ rowCount, kernel, shapeCount: axes.length });
  fold.derivatives = false;
  const shape = new Float64Array(axes.length);
  for (let node = 0; node < nodeCount; node++) {
    shapeOfNode(axes, node, shape);
    trial.fold(kernel, shape, capNm, scale, fold);
    shares.set(fold.share, node * rowCount);
  }
  return { axes, shares, capShare };
}

/** Whitened folds and normal matrices of the levels on the search lattice. */
export function weighLattice(folds: LatticeFolds, weights: LevelWeights): SearchGrid {
  const { whitener, unit, levelPriors } = weights;
  const rowCount = unit.length;
  const nodeCount = folds.shares.length / rowCount;
  const shares = Float64Array.from(folds.shares);
  const capShare = Float64Array.from(folds.capShare);
  whiten(whitener, capShare);
  const grams = new Float64Array(nodeCount * levelPriors.length ** 2);
  for (let node = 0; node < nodeCount; node++) {
    whiten(whitener, shares, node * rowCount);
    fillGram(weights, shares, node, capShare, grams);
  }
  return { nodeCount, axes: folds.axes, shares, capShare, grams };
}

/** Values of the shape at a node, the first parameter changing fastest. */
export function shapeOfNode(
  axes: readonly Float64Array[],
  node: number,
  shape: Float64Array,
): void {
  let rest = node;
  for (let k = 0; k < axes.length; k++) {
    const axis = axes[k]!;
    const place = rest % axis.length;
    shape[k] = axis[place]!;
    rest = (rest - place) / axis.length;
  }
}

/** Gram matrix of the columns 1 − q − S, S and q, and the priors. */
function fillGram(
  { unit, levelPriors }: LevelWeights,
  shares: Float64Array,
  node: number,
  capShare: Float64Array,
  grams: Float64Array,
): void {
  const n = levelPriors.length;
  const rowCount = unit.length;
  const at = node * n * n;
  for (let i = 0; i < rowCount; i++) {
    const bulk = shares[node * rowCount + i]!;
    const cap = n > 2 ? capShare[i]! : 0;
    const top = unit[i]! - cap - bulk;
    grams[at] = grams[at]! + top * top;
    grams[at + 1] = grams[at + 1]! + top * bulk;
    grams[at + n + 1] = grams[at + n + 1]! + bulk * bulk;
    if (n < 3) continue;
    grams[at + 2] = grams[at + 2]! + top * cap;
    grams[at + 5] = grams[at + 5]! + bulk * cap;
    grams[at + 8] = grams[at + 8]! + cap * cap;
  }
  for (let k = 0; k < n; k++) {
    grams[at + k * n + k] = grams[at + k * n + k]! + levelPriors[k]! ** 2;
    for (let l = 0; l < k; l++) grams[at + k * n + l] = grams[at + l * n + k]!;
  }
}

/** Depths denser where more muons stop: at equal steps of half depth, half mean cumulative stopping. */
function blendedDepths(
  { kernel, capNm, scale, deepestNm }: LatticeInput,
  count: number,
): Float64Array {
  const fine = 128;
  const blend = new Float64Array(fine + 1);
  const share = new Float64Array(kernel.rowCount);
  const density = new Float64Array(kernel.rowCount);
  for (let k = 0; k <= fine; k++) {
    foldStart(kernel, (capNm + (deepestNm * k) / fine) / scale, share, density);
    const sum = share.reduce((total, value) => total + value, 0);
    blend[k] = sum / share.length + k / fine;
  }
  let k = 0;
  return Float64Array.from({ length: count }, (_, node) => {
    const goal = blend[0]! + ((blend[fine]! - blend[0]!) * node) / (count - 1);
    while (k < fine - 1 && blend[k + 1]! < goal) k++;
    const t = Math.min(1, Math.max(0, (goal - blend[k]!) / (blend[k + 1]! - blend[k]!)));
    return (deepestNm * (k + t)) / fine;
  });
}
