import fc from 'fast-check';

/** Gaps of bins and knots, nm: from fine to coarse. */
export const gap = fc.double({ min: 0.05, max: 20, noNaN: true });

/** Uneven knots, the first at the surface or below it. */
export const knots = fc
  .record({
    firstNm: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 10, noNaN: true })),
    gaps: fc.array(gap, { minLength: 1, maxLength: 10 }),
  })
  .map(({ firstNm, gaps }) =>
    gaps.reduce((depths, step) => [...depths, depths[depths.length - 1]! + step], [firstNm]),
  );
