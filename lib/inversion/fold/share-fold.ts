import type { EdgeFold, FoldScratch } from './fold-edge';

/** Cumulative share and its derivatives at the bin edges of one group. */
export interface CumulativeScratch {
  /** Depth below the cap of each bin edge, nm. */
  depthsNm: Float64Array;
  /** M(x) = ∫₀ˣ s dx at each of them, 0 above the surface. */
  integral: Float64Array;
  /** s(x), 0 above the surface. */
  share: Float64Array;
  /** ∂M/∂shape_k. */
  byShape: readonly Float64Array[];
}

/** Populated share per row and its derivatives by the shape parameters and by the depth scale, with the scratch of a fold. */
export interface ShareFold {
  share: Float64Array;
  byShape: readonly Float64Array[];
  byScale: Float64Array;
  scratch: FoldScratch;
  edge: EdgeFold;
  cumulative: CumulativeScratch;
  /** False leaves the derivatives alone. */
  derivatives: boolean;
}
