import { foldEdge } from '../fold/fold-edge';
import { normalInto } from '../statistics/normal-table';
import { depthParameter, extentParameter, widthAxis } from './edge-parameters';
import { normalShare, normalStretch } from './normal-share';
import type { TrialProfile } from './trial-profile';

/** An edge moves the fold on the scale of the straggling, so tens of nodes find every valley. */
const DEPTHS = 24;
const WIDTH_SHARES = [0, 0.02, 0.065, 0.18, 0.45];

const cdf = new Float64Array(1);
const pdf = new Float64Array(1);

/**
 * Graded edge: s(x) = ½ erfc((W − x)/(√2 w)) = Φ((x − W)/w); w is the Gaussian σ of the edge, 0 for a step.
 * With depth scale a and cap d the fold of x → a·x equals the fold of the unscaled file with edge (W + d)/a,
 * width w/a and start d/a.
 */
export function gradedEdge(deepestNm: number): TrialProfile {
  return {
    kind: 'graded',
    shape: [depthParameter('edgeDepthNm', deepestNm), extentParameter('edgeWidthNm', deepestNm)],
    edges: [{ position: [0], width: 1 }],
    crooked: false,
    kinked: false,
    share: (depthNm, shape) => normalShare(depthNm - shape[0]!, shape[1]!),
    slopes(depthNm, shape, slopes) {
      const t = (depthNm - shape[0]!) / shape[1]!;
      normalInto(shape[1] === 0 ? (depthNm < shape[0]! ? -Infinity : Infinity) : t, cdf, pdf, 0);
      const density = shape[1]! > 0 ? pdf[0]! / shape[1]! : 0;
      slopes[0] = cdf[0]!;
      slopes[1] = -density;
      slopes[2] = shape[1]! > 0 ? -t * density : 0;
    },
    stretches: (shape) => (shape[1]! > 0 ? [normalStretch(shape[0]!, shape[1]!)] : []),
    landmarks: (shape) => [{ depthNm: shape[0]!, widthNm: shape[1]! }],
    searchAxes: ({ depths }) => [depths(DEPTHS), widthAxis(WIDTH_SHARES, deepestNm)],
    starts: 3,
    fold(kernel, shape, capNm, scale, out) {
      const u = (shape[0]! + capNm) / scale;
      const v = shape[1]! / scale;
      const start = capNm / scale;
      const { share, byEdge, byWidth, byStart } = out.edge;
      out.edge.derivatives = out.derivatives;
      foldEdge(kernel, u, v, start, out.scratch, out.edge);
      const [intoEdge, intoWidth] = out.byShape as [Float64Array, Float64Array];
      if (!out.derivatives) {
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
}
