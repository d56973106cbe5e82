import type { Ridge } from '@/components/charts/chart-types';

/**
 * A stopping profile with at most `most` bins: runs of neighbouring bins become one that holds their
 * mass. It keeps a page small where a set has thousands of bins, and changes no mass.
 */
export function thinRidge(ridge: Ridge, most: number): Ridge {
  const bins = ridge.mass.length;
  if (bins <= most) {
    return { ...ridge, edgesNm: Array.from(ridge.edgesNm), mass: Array.from(ridge.mass) };
  }
  const starts = Array.from({ length: most + 1 }, (_, i) => Math.round((i * bins) / most));
  return {
    ...ridge,
    edgesNm: starts.map((start) => ridge.edgesNm[start] ?? 0),
    mass: starts.slice(1).map((end, i) => {
      let sum = 0;
      for (let bin = starts[i] ?? 0; bin < end; bin++) sum += ridge.mass[bin] ?? 0;
      return sum;
    }),
  };
}
