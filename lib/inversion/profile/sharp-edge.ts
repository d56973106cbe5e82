import { foldEdge } from '../fold/fold-edge';
import { depthParameter } from './edge-parameters';
import type { TrialProfile } from './trial-profile';

/** One shape parameter and cheap folds: the search may be fine. */
const DEPTHS = 192;

/** Sharp edge: s(x) = 0 for x < W and 1 beyond. The share of a bin [l, r] is clamp((r − W)/(r − l), 0, 1), so S is continuous in W. */
export function sharpEdge(deepestNm: number): TrialProfile {
  return {
    kind: 'sharp',
    shape: [depthParameter('edgeDepthNm', deepestNm)],
    edges: [{ position: [0], width: null }],
    crooked: false,
    kinked: true,
    share: (depthNm, shape) => (depthNm < shape[0]! ? 0 : 1),
    slopes(depthNm, shape, slopes) {
      slopes[0] = depthNm < shape[0]! ? 0 : 1;
      slopes[1] = 0;
    },
    stretches: () => [],
    landmarks: (shape) => [{ depthNm: shape[0]!, widthNm: 0 }],
    searchAxes: ({ depths }) => [depths(DEPTHS)],
    starts: 3,
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
}
