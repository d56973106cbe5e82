import { foldEdge } from '../fold/fold-edge';
import { normalInto } from '../statistics/normal-table';
import type { TrialProfile } from './trial-profile';

const cdf = new Float64Array(1);
const pdf = new Float64Array(1);

function phi(distanceNm: number, widthNm: number): number {
  if (widthNm === 0) return distanceNm < 0 ? 0 : 1;
  normalInto(distanceNm / widthNm, cdf, pdf, 0);
  return cdf[0]!;
}

/**
 * Graded edge: s(x) = ½ erfc((W − x)/(√2 w)) = Φ((x − W)/w); w is the Gaussian σ of the edge, 0 for a step.
 * With depth scale a and cap d the fold of x → a·x equals the fold of the unscaled file with edge (W + d)/a,
 * width w/a and start d/a.
 */
export const gradedEdge: TrialProfile = {
  kind: 'graded',
  shapeNames: ['edgeDepthNm', 'edgeWidthNm'],
  widths: [1],
  kinked: false,
  share: (depthNm, shape) => phi(depthNm - shape[0]!, shape[1]!),
  fold(kernel, shape, capNm, scale, out) {
    const u = (shape[0]! + capNm) / scale;
    const v = shape[1]! / scale;
    const start = capNm / scale;
    const { share, byEdge, byWidth, byStart } = out.edge;
    foldEdge(kernel, u, v, start, out.scratch, out.edge);
    const [intoEdge, intoWidth] = out.byShape as [Float64Array, Float64Array];
    if (!out.edge.derivatives) {
      out.share.set(share);
      return;
    }
    for (let i = 0; i < kernel.rowCount; i++) {
      out.share[i] = share[i]!;
      intoEdge[i] = byEdge[i]! / scale;
      intoWidth[i] = byWidth[i]! / scale;
      out.byScale[i] = -(u * byEdge[i]! + v * byWidth[i]! + start * byStart[i]!) / scale;
    }
  },
};
