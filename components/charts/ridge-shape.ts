import type { Ridge } from './chart-types';

export interface RidgePoint {
  depthNm: number;
  /** Stopping density, share per nm. */
  density: number;
}

/**
 * A stopping profile as densities on an even grid of `cells` between two depths: the mass inside
 * each cell over its width, exact for a density that is uniform within a bin. Depth is
 * scale·x − cap, so it counts from the semiconductor surface.
 */
export function ridgePoints(
  ridge: Ridge,
  [fromNm, toNm]: readonly [number, number],
  cells: number,
  { depthScale = 1, capThicknessNm = 0 }: { depthScale?: number; capThicknessNm?: number } = {},
): RidgePoint[] {
  const step = (toNm - fromNm) / cells;
  const toStack = (depthNm: number) => (depthNm + capThicknessNm) / depthScale;
  const cumulative = cumulativeReader(ridge);
  let before = cumulative(toStack(fromNm));
  return Array.from({ length: cells }, (_, cell) => {
    const end = cumulative(toStack(fromNm + (cell + 1) * step));
    const density = Math.max(0, (end - before) / step);
    before = end;
    return { depthNm: fromNm + (cell + 0.5) * step, density };
  });
}

/** Cumulative stopping fraction at ascending depths; the reader only walks forward. */
function cumulativeReader({ edgesNm, mass }: Ridge): (xNm: number) => number {
  let bin = 0;
  let passed = 0;
  return (xNm) => {
    while (bin < mass.length && edgesNm[bin + 1]! <= xNm) passed += mass[bin++]!;
    if (bin >= mass.length || xNm <= edgesNm[bin]!) return passed;
    const share = (xNm - edgesNm[bin]!) / (edgesNm[bin + 1]! - edgesNm[bin]!);
    return passed + mass[bin]! * share;
  };
}

/** Depth below which the share `u` of a ridge stops, nm from the surface of the stack. */
export function ridgeQuantile({ edgesNm, mass }: Ridge, u: number): number {
  let passed = 0;
  for (let bin = 0; bin < mass.length; bin++) {
    const here = mass[bin]!;
    if (here > 0 && passed + here >= u) {
      return edgesNm[bin]! + ((u - passed) / here) * (edgesNm[bin + 1]! - edgesNm[bin]!);
    }
    passed += here;
  }
  return edgesNm[mass.length] ?? 0;
}
