import type { EdgeParameters, Stretch, TrialProfile } from '../profile/trial-profile';
import { GAUSS_NODES, GAUSS_WEIGHTS } from '../statistics/gauss-legendre';
import { foldCumulative } from './fold-cumulative';
import type { Kernel } from './kernel';
import type { CumulativeScratch, ShareFold } from './share-fold';

/** How the probe bends the share: g(s) = s(1 + K)/(1 + K·s). */
export interface Bending {
  /** K at a shape. */
  steepnessOf: (shape: ArrayLike<number>) => number;
  /** The shape parameter that K depends on, and ∂K/∂parameter; null where K is given. */
  byBulk: { at: number; slope: number } | null;
}

interface Quadrature {
  nodes: readonly number[];
  weights: readonly number[];
}
const SMOOTH: Quadrature = { nodes: GAUSS_NODES, weights: GAUSS_WEIGHTS };
const CONSTANT: Quadrature = { nodes: [0], weights: [2] };

/** More shape parameters than any profile has. */
const MOST_SHAPES = 8;
const slopes = new Float64Array(1 + MOST_SHAPES);
/** Running ∫g and its derivatives by the shape. */
const sums = new Float64Array(1 + MOST_SHAPES);

/**
 * Fold of g(s) by quadrature of its cumulative integral between neighbouring bin edges, cut where s has kinks: five-point
 * Gauss-Legendre panels no wider than a stretch of the profile asks for. A step of s moves the integral by its jump.
 */
export function foldSeenShare(
  trial: TrialProfile,
  bending: Bending,
  kernel: Kernel,
  shape: ArrayLike<number>,
  capNm: number,
  scale: number,
  out: ShareFold,
): void {
  const stretches = trial.stretches(shape);
  foldCumulative(kernel, capNm, scale, out, (scratch, first, count, derivatives) => {
    integrate(trial, bending, stretches, shape, scratch, first, count);
    if (!derivatives) return;
    for (const edge of trial.edges) addJump(trial, bending, edge, shape, scratch, first, count);
  });
}

function seen(steepness: number, share: number): number {
  return (share * (1 + steepness)) / (1 + steepness * share);
}

function integrate(
  trial: TrialProfile,
  bending: Bending,
  stretches: readonly Stretch[],
  shape: ArrayLike<number>,
  { depthsNm, integral, share, byShape }: CumulativeScratch,
  first: number,
  count: number,
): void {
  const steepness = bending.steepnessOf(shape);
  sums.fill(0);
  let from = 0;
  for (let j = first; j < count; j++) {
    const to = depthsNm[j]!;
    while (from < to) {
      const cut = nextCut(trial, stretches, shape, from, to);
      const step = stepAt(stretches, (from + cut) / 2);
      // Outside every stretch s is constant: its middle says all.
      const panels = step === Infinity ? 1 : Math.ceil((cut - from) / step);
      const half = (cut - from) / panels / 2;
      const nodes = step === Infinity ? CONSTANT : SMOOTH;
      for (let p = 0; p < panels; p++)
        addPanel(trial, bending, steepness, shape, from + (2 * p + 1) * half, half, nodes);
      from = cut;
    }
    integral[j] = sums[0]!;
    for (let k = 0; k < byShape.length; k++) byShape[k]![j] = sums[1 + k]!;
    share[j] = seen(steepness, trial.share(to, shape));
  }
}

function addPanel(
  trial: TrialProfile,
  { byBulk }: Bending,
  steepness: number,
  shape: ArrayLike<number>,
  middle: number,
  half: number,
  { nodes, weights }: Quadrature,
): void {
  const count = trial.shape.length;
  for (let g = 0; g < nodes.length; g++) {
    trial.slopes(middle + half * nodes[g]!, shape, slopes);
    const s = slopes[0]!;
    const weight = half * weights[g]!;
    const below = 1 + steepness * s;
    sums[0] = sums[0]! + (weight * s * (1 + steepness)) / below;
    const bySeen = (weight * (1 + steepness)) / (below * below);
    for (let k = 0; k < count; k++) sums[1 + k] = sums[1 + k]! + bySeen * slopes[1 + k]!;
    if (byBulk) {
      const at = 1 + byBulk.at;
      sums[at] = sums[at]! + (weight * byBulk.slope * s * (1 - s)) / (below * below);
    }
  }
}

/** The first kink or step between two depths, or the second depth. */
function nextCut(
  { edges }: TrialProfile,
  stretches: readonly Stretch[],
  shape: ArrayLike<number>,
  from: number,
  to: number,
): number {
  let cut = to;
  for (const { fromNm, toNm } of stretches) {
    if (fromNm > from && fromNm < cut) cut = fromNm;
    if (toNm > from && toNm < cut) cut = toNm;
  }
  for (const edge of edges) {
    const at = positionOf(edge, shape);
    if (at > from && at < cut) cut = at;
  }
  return cut;
}

/** Widest panel at a depth; Infinity outside every stretch. */
function stepAt(stretches: readonly Stretch[], depthNm: number): number {
  let step = Infinity;
  for (const { fromNm, toNm, stepNm } of stretches)
    if (depthNm > fromNm && depthNm < toNm) step = Math.min(step, stepNm);
  return step;
}

function positionOf({ position }: EdgeParameters, shape: ArrayLike<number>): number {
  let depth = 0;
  for (const k of position) depth += shape[k]!;
  return depth;
}

/** A step at x_e moves ∫g beyond it by −(g(s⁺) − g(s⁻)) per nm. */
function addJump(
  trial: TrialProfile,
  { steepnessOf }: Bending,
  edge: EdgeParameters,
  shape: ArrayLike<number>,
  { depthsNm, byShape }: CumulativeScratch,
  first: number,
  count: number,
): void {
  if (edge.width !== null && shape[edge.width]! > 0) return;
  const at = positionOf(edge, shape);
  const steepness = steepnessOf(shape);
  const nudge = 1e-9 * Math.max(1, at);
  const jump =
    seen(steepness, trial.share(at + nudge, shape)) -
    seen(steepness, trial.share(at - nudge, shape));
  for (let j = first; j < count; j++) {
    if (depthsNm[j]! <= at) continue;
    for (const k of edge.position) byShape[k]![j] = byShape[k]![j]! - jump;
  }
}
