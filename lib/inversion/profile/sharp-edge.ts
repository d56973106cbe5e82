import { foldEdge } from '../fold/fold-edge';
import type { TrialProfile } from './trial-profile';

/** Sharp edge: s(x) = 0 for x < W and 1 beyond. The share of a bin [l, r] is clamp((r − W)/(r − l), 0, 1), so S is continuous in W. */
export const sharpEdge: TrialProfile = {
  kind: 'sharp',
  shapeNames: ['edgeDepthNm'],
  widths: [],
  kinked: true,
  share: (depthNm, shape) => (depthNm < shape[0]! ? 0 : 1),
  fold(kernel, shape, capNm, scale, out) {
    const u = (shape[0]! + capNm) / scale;
    const start = capNm / scale;
    const { share, byEdge, byStart } = out.edge;
    foldEdge(kernel, u, 0, start, out.scratch, out.edge);
    const intoEdge = out.byShape[0]!;
    for (let i = 0; i < kernel.rowCount; i++) {
      out.share[i] = share[i]!;
      intoEdge[i] = byEdge[i]! / scale;
      out.byScale[i] = -(u * byEdge[i]! + start * byStart[i]!) / scale;
    }
  },
};
