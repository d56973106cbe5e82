import type { Kernel } from '../fold/kernel';
import type { ShareFold } from '../fold/share-fold';
import type { ParameterName, ProfileKind } from '../types';

/** A parameter of the shape and the range that is searched. */
export interface ShapeParameter {
  name: ParameterName;
  lower: number;
  upper: number;
  /** Whether a bound is the natural end of the parameter, so that an interval ends there and is not open. */
  closed: readonly [boolean, boolean];
  /** Held at this value unless the settings say otherwise; null where it is free. */
  given: number | null;
}

/** An edge of a profile, by the shape parameters that it is made of. */
export interface EdgeParameters {
  /** Its depth is their sum; the last of them moves this edge. */
  position: readonly number[];
  /** Its width; zero makes a step. null for an edge that is always a step. */
  width: number | null;
}

/** Where the profile varies: on stretches [from, to] smoothly on the scale of step; elsewhere it is constant. */
export interface Stretch {
  fromNm: number;
  toNm: number;
  stepNm: number;
}

/**
 * A trial profile of one fit: its shape parameters, its populated share s(x) and the exact fold of what the probe sees of s. A
 * new one is one file that makes this and one line in trial-profiles.ts. `shape` holds the values in the order of `shape`
 * below; θ of the fit begins with them.
 */
export interface TrialProfile {
  kind: ProfileKind;
  shape: readonly ShapeParameter[];
  edges: readonly EdgeParameters[];
  /** Valleys of χ² bend, or others run beside them: several edges, or a share that the probe sees bent. */
  crooked: boolean;
  /** Always steps: χ² has kinks at the bin borders, and the last digits are found by bracketing instead of derivatives. */
  kinked: boolean;
  /** s(x) at a depth below the cap. */
  share(depthNm: number, shape: ArrayLike<number>): number;
  /** s(x) into slopes[0] and ∂s/∂shape_k into slopes[1 + k]. A step counts with its jump apart. */
  slopes(depthNm: number, shape: ArrayLike<number>, slopes: Float64Array): void;
  /** Where s varies, in ascending order of fromNm. */
  stretches(shape: ArrayLike<number>): readonly Stretch[];
  /** Depth and width of each edge, for pictures and sentences. */
  landmarks(shape: ArrayLike<number>): readonly { depthNm: number; widthNm: number }[];
  /** Values of each shape parameter that the global search tries, ascending. */
  searchAxes(range: SearchRange): Float64Array[];
  /** Valleys of the search that are followed to their bottom. */
  starts: number;
  /** Fold through the kernel with depths scaled by `scale` and a cap of capNm in front. */
  fold(
    kernel: Kernel,
    shape: ArrayLike<number>,
    capNm: number,
    scale: number,
    out: ShareFold,
  ): void;
}

export interface SearchRange {
  /** Deepest depth below the cap where a point in use has stops, nm. */
  deepestNm: number;
  /** Whether each shape parameter is held: its axis is then its value alone. */
  held: readonly boolean[];
  /** This many depths, denser where more muons stop. */
  depths(count: number): Float64Array;
}
