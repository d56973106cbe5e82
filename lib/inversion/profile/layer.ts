import { foldCumulative } from '../fold/fold-cumulative';
import type { CumulativeScratch } from '../fold/share-fold';
import { depthParameter, extentParameter, widthAxis } from './edge-parameters';
import { normalInto } from '../statistics/normal-table';
import { normalShare, normalStretch } from './normal-share';
import type { Stretch, TrialProfile } from './trial-profile';

/** Nodes of depth and thickness by the number of free widths: a width that is held leaves its share of the nodes to them. */
const DEPTHS = [64, 40, 28];
const THICKNESSES = [26, 18, 13];
const THICKEST_SHARE = 0.8;
const WIDTH_SHARES = [0, 0.02, 0.07, 0.25, 0.8];

/** W₁, w₁, W₂, w₂ and the limits between which s > 0. */
interface Edges {
  near: number;
  nearWidth: number;
  far: number;
  farWidth: number;
  from: number;
  to: number;
}

const edges: Edges = { near: 0, nearWidth: 0, far: 0, farWidth: 0, from: 0, to: 0 };

function readEdges(shape: ArrayLike<number>): Edges {
  const near = (edges.near = shape[0]!);
  const w = (edges.nearWidth = shape[1]!);
  const far = (edges.far = near + shape[2]!);
  const v = (edges.farWidth = shape[3]!);
  // Φ₁ = Φ₂ at one depth where the widths differ; a step limits s by itself.
  const crossing = (near * v - far * w) / (v - w);
  edges.from = w === 0 ? near : v > w ? Math.max(0, crossing) : 0;
  edges.to = v === 0 ? far : w > v ? crossing : Infinity;
  return edges;
}

/**
 * Layer: s(x) = max(0, Φ((x − W₁)/w₁) − Φ((x − W₂)/w₂)), W₂ = W₁ + thickness; rises at W₁ and falls again at W₂ (a quantum well,
 * a buried channel). A width of 0 makes that edge a step. The difference would go below zero on one side where the widths
 * differ; there is no layer there. Its integral is G₁ − G₂ between the limits of the layer, so the fold is exact.
 */
export function layer(deepestNm: number): TrialProfile {
  return {
    kind: 'layer',
    shape: [
      depthParameter('edgeDepthNm', deepestNm),
      extentParameter('edgeWidthNm', deepestNm),
      extentParameter('layerThicknessNm', deepestNm),
      extentParameter('farEdgeWidthNm', deepestNm),
    ],
    edges: [
      { position: [0], width: 1 },
      { position: [0, 2], width: 3 },
    ],
    crooked: true,
    kinked: false,
    share(depthNm, shape) {
      const { near, nearWidth, far, farWidth } = readEdges(shape);
      return Math.max(
        0,
        normalShare(depthNm - near, nearWidth) - normalShare(depthNm - far, farWidth),
      );
    },
    slopes: layerSlopes,
    stretches,
    landmarks: (shape) => [
      { depthNm: shape[0]!, widthNm: shape[1]! },
      { depthNm: shape[0]! + shape[2]!, widthNm: shape[3]! },
    ],
    searchAxes({ depths, held }) {
      const free = (held[1] ? 0 : 1) + (held[3] ? 0 : 1);
      return [
        depths(DEPTHS[free]!),
        widthAxis(WIDTH_SHARES, deepestNm),
        thicknessAxis(THICKNESSES[free]!, deepestNm),
        widthAxis(WIDTH_SHARES, deepestNm),
      ];
    },
    starts: 24,
    fold(kernel, shape, capNm, scale, out) {
      foldCumulative(kernel, capNm, scale, out, (scratch, first, count, derivatives) =>
        cumulate(shape, scratch, first, count, derivatives),
      );
    },
  };
}

/** Thin layers closer together: they differ by a share of their thickness. */
function thicknessAxis(count: number, deepestNm: number): Float64Array {
  return Float64Array.from(
    { length: count },
    (_, k) => THICKEST_SHARE * deepestNm * ((k + 1) / count) ** 1.6,
  );
}

function layerSlopes(depthNm: number, shape: ArrayLike<number>, slopes: Float64Array): void {
  const edge = readEdges(shape);
  const { near, nearWidth, far, farWidth, from, to } = edge;
  if (depthNm < from || depthNm > to) {
    slopes.fill(0);
    return;
  }
  normalsAt(depthNm, edge);
  const rise = nearWidth > 0 ? pdf[NEAR]! / nearWidth : 0;
  const fall = farWidth > 0 ? pdf[FAR]! / farWidth : 0;
  slopes[0] = cdf[NEAR]! - cdf[FAR]!;
  slopes[1] = fall - rise;
  slopes[2] = nearWidth > 0 ? (-rise * (depthNm - near)) / nearWidth : 0;
  slopes[3] = fall;
  slopes[4] = farWidth > 0 ? (fall * (depthNm - far)) / farWidth : 0;
}

function stretches(shape: ArrayLike<number>): Stretch[] {
  const { near, nearWidth, far, farWidth, from, to } = readEdges(shape);
  const list: Stretch[] = [];
  if (nearWidth > 0) list.push(normalStretch(near, nearWidth));
  if (farWidth > 0) list.push(normalStretch(far, farWidth));
  // The limits are kinks of s: a stretch of no length cuts there.
  for (const limit of [from, to]) {
    if (limit > 0 && limit < Infinity) list.push({ fromNm: limit, toNm: limit, stepNm: Infinity });
  }
  return list.sort((a, b) => a.fromNm - b.fromNm);
}

const NEAR = 0;
const FAR = 1;
const cdf = new Float64Array(2);
const pdf = new Float64Array(2);

/** Φ and φ of both edges at a depth; φ = 0 at a step. A far step counts from beyond it: the limit of the layer lies there. */
function normalsAt(x: number, { near, nearWidth, far, farWidth }: Edges): void {
  normalInto(
    nearWidth > 0 ? (x - near) / nearWidth : x < near ? -Infinity : Infinity,
    cdf,
    pdf,
    NEAR,
  );
  normalInto(farWidth > 0 ? (x - far) / farWidth : -Infinity, cdf, pdf, FAR);
}

/** F(x) = G₁ − G₂ from the normals there, G = (x − W)Φ + wφ. */
function integralFrom(x: number, { near, nearWidth, far, farWidth }: Edges): number {
  return (
    (x - near) * cdf[NEAR]! + nearWidth * pdf[NEAR]! - (x - far) * cdf[FAR]! - farWidth * pdf[FAR]!
  );
}

/** M(x) = F(min(x, to)) − F(from); ∂G/∂W = −Φ and ∂G/∂w = φ. Where a limit is a step it moves with its edge. */
function cumulate(
  shape: ArrayLike<number>,
  { depthsNm, integral, share, byShape }: CumulativeScratch,
  first: number,
  count: number,
  derivatives: boolean,
): void {
  const edge = readEdges(shape);
  const { from, to } = edge;
  normalsAt(from, edge);
  const begin = integralFrom(from, edge);
  const nearBegin = cdf[NEAR]!;
  const farBegin = cdf[FAR]!;
  const nearDensity = pdf[NEAR]!;
  const farDensity = pdf[FAR]!;
  const nearPush = edge.nearWidth === 0 ? 1 - farBegin : 0;
  const [byEdge, byWidth, byThickness, byFarWidth] = byShape as [
    Float64Array,
    Float64Array,
    Float64Array,
    Float64Array,
  ];
  for (let j = first; j < count; j++) {
    const depth = depthsNm[j]!;
    if (depth <= from) {
      integral[j] = share[j] = byEdge[j] = byWidth[j] = byThickness[j] = byFarWidth[j] = 0;
      continue;
    }
    const x = Math.min(depth, to);
    normalsAt(x, edge);
    integral[j] = integralFrom(x, edge) - begin;
    if (!derivatives) continue;
    share[j] = depth < to ? cdf[NEAR]! - cdf[FAR]! : 0;
    const farPush = edge.farWidth === 0 && depth >= to ? cdf[NEAR]! : 0;
    const byFar = cdf[FAR]! - farBegin + farPush;
    byEdge[j] = nearBegin - cdf[NEAR]! - nearPush + byFar;
    byWidth[j] = pdf[NEAR]! - nearDensity;
    byThickness[j] = byFar;
    byFarWidth[j] = farDensity - pdf[FAR]!;
  }
}
