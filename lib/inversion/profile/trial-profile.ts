import type { FoldScratch, EdgeFold } from '../fold/fold-edge';
import type { Kernel } from '../fold/kernel';
import type { ParameterName, ProfileKind } from '../types';

/** Populated share per row and its derivatives by the shape parameters and by the depth scale. */
export interface ShareFold {
  share: Float64Array;
  byShape: readonly Float64Array[];
  byScale: Float64Array;
  scratch: FoldScratch;
  edge: EdgeFold;
}

/**
 * A trial profile: its shape parameters, its populated share s(x) and the exact fold of s. A new one is one file that
 * exports this and one line in trial-profiles.ts.
 */
export interface TrialProfile {
  kind: ProfileKind;
  shapeNames: readonly ParameterName[];
  /** Which shape parameters are widths: zero makes a step. */
  widths: readonly number[];
  /** χ² has kinks in the edge at the bin borders, so the last digits are found by bracketing instead of derivatives. */
  kinked: boolean;
  /** s(x) at a depth below the cap. shape holds the values in the order of shapeNames. */
  share(depthNm: number, shape: ArrayLike<number>): number;
  /** Fold through the kernel with depths scaled by `scale` and a cap of capNm in front. */
  fold(
    kernel: Kernel,
    shape: ArrayLike<number>,
    capNm: number,
    scale: number,
    out: ShareFold,
  ): void;
}
