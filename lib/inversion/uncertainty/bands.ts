/** Pointwise bands of the profile value over depth. */
export interface Bands {
  kind: 'delta' | 'bootstrap';
  depthsNm: Float64Array;
  lower68: Float64Array;
  upper68: Float64Array;
  lower95: Float64Array;
  upper95: Float64Array;
}

/** Normal quantiles of two-sided 68.27 % and 95 %. */
export const SIGMAS_68 = 1;
export const SIGMAS_95 = 1.959963984540054;

export function emptyBands(kind: Bands['kind'], depthsNm: ArrayLike<number>): Bands {
  const array = (): Float64Array => new Float64Array(depthsNm.length);
  return {
    kind,
    depthsNm: Float64Array.from(depthsNm),
    lower68: array(),
    upper68: array(),
    lower95: array(),
    upper95: array(),
  };
}
