import { extent, scaleLinear, type ScaleLinear } from 'd3';

import type { Margin, ScanCurve, ScanMark } from './chart-types';

/** Where a scan panel draws; the overlay that drags levels and switches points uses the same numbers. */
export interface ScanLayout {
  x: ScaleLinear<number, number>;
  y: ScaleLinear<number, number>;
  left: number;
  right: number;
  top: number;
  bottom: number;
}

const MARGIN: Margin = { top: 46, right: 14, bottom: 44, left: 54 };

/** Horizontal scale shared by the scan and its residuals, so that they stand under each other. */
export function energyScale(
  energiesKeV: readonly number[],
  width: number,
): ScaleLinear<number, number> {
  const most = Math.max(1, ...energiesKeV);
  return scaleLinear()
    .domain([0, most * 1.05])
    .range([MARGIN.left, Math.max(MARGIN.left + 40, width - MARGIN.right)]);
}

export function scanLayout({
  marks,
  curves,
  width,
  height,
  keep = [],
}: {
  marks: readonly ScanMark[];
  curves: readonly Pick<ScanCurve, 'values'>[];
  width: number;
  height: number;
  /** Values that must stay inside, such as the levels that can be dragged. */
  keep?: readonly number[];
}): ScanLayout {
  const x = energyScale(
    marks.map((mark) => mark.energyKeV),
    width,
  );
  const values = [
    ...marks.flatMap((mark) => [mark.observed - mark.sigma, mark.observed + mark.sigma]),
    ...curves.flatMap((curve) => Array.from(curve.values)),
    ...keep,
  ].filter((value) => Number.isFinite(value));
  const [low = 0, high = 1] = extent(values);
  const pad = Math.max(1e-9, (high - low) * 0.06);
  const [top, bottom] = [MARGIN.top, Math.max(MARGIN.top + 40, height - MARGIN.bottom)];
  const y = scaleLinear()
    .domain([low - pad, high + pad])
    .range([bottom, top]);
  return { x, y, left: MARGIN.left, right: x.range()[1] ?? width, top, bottom };
}
