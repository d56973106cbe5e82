import type { ParameterName } from '../types';
import type { ShapeParameter } from './trial-profile';

/** An edge at the surface or past the last bin is no edge at all: there an interval of its depth stays open. */
export function depthParameter(name: ParameterName, deepestNm: number): ShapeParameter {
  return { name, lower: 0, upper: deepestNm, closed: [false, false], given: null };
}

/** A width, or a thickness, ends naturally at zero. */
export function extentParameter(name: ParameterName, deepestNm: number): ShapeParameter {
  return { name, lower: 0, upper: deepestNm, closed: [true, false], given: null };
}

/** Widths that the search tries, as shares of the depth range: a step, then log-spaced. */
export function widthAxis(shares: readonly number[], deepestNm: number): Float64Array {
  return Float64Array.from(shares, (share) => share * deepestNm);
}
