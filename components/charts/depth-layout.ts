import { scaleLinear, type ScaleLinear } from 'd3';

import type { ProfileSeries, Ridge } from './chart-types';
import { ridgeQuantile } from './ridge-shape';

/** Where the panels of a depth figure stand; the overlay that drags the edge uses the same numbers. */
export interface DepthLayout {
  x: ScaleLinear<number, number>;
  left: number;
  right: number;
  ridges: { top: number; height: number };
  carriers: { top: number; height: number };
  strip: { top: number; height: number };
  axisY: number;
}

const LEFT = 54;
const RIGHT = 16;
const STRIP = 12;
const BELOW = 46;
const GAP = 42;

export function depthLayout({
  width,
  height,
  capThicknessNm,
  maxDepthNm,
}: {
  width: number;
  height: number;
  capThicknessNm: number;
  maxDepthNm: number;
}): DepthLayout {
  const [left, right] = [LEFT, Math.max(LEFT + 40, width - RIGHT)];
  const x = scaleLinear().domain([-capThicknessNm, maxDepthNm]).range([left, right]);
  const axisY = height - BELOW;
  const room = axisY - STRIP - 14 - GAP;
  const ridges = { top: 4, height: Math.round(room * 0.4) };
  const carriersTop = ridges.top + ridges.height + GAP;
  const strip = { top: axisY - STRIP, height: STRIP };
  const carriers = { top: carriersTop, height: strip.top - 14 - carriersTop };
  return { x, left, right, ridges, carriers, strip, axisY };
}

/** Depth that a figure should reach: the deepest fitted depth, or the 99 % quantile of the deepest ridge. */
export function depthLimit(
  ridges: readonly Ridge[],
  series: readonly ProfileSeries[],
  {
    depthScale,
    capThicknessNm,
  }: {
    depthScale: number;
    capThicknessNm: number;
  },
): number {
  const fitted = series.map((one) => one.profile.points.at(-1)?.depthNm ?? 0);
  const stopped = ridges.map((ridge) => ridgeQuantile(ridge, 0.99) * depthScale - capThicknessNm);
  return Math.max(1, ...(fitted.some((depth) => depth > 0) ? fitted : stopped));
}
