import { scaleLinear } from 'd3';

import { AxisBottom, AxisTitle } from './axis';
import { CarrierPanel } from './carrier-panel';
import { carrierScale } from './carrier-scale';
import type { ProfileSeries } from './chart-types';

const LEFT = 54;
const TOP = 46;
const BOTTOM = 46;

/** Carrier profiles over depth: bands for the first, lines for all, hatching where the scan says nothing. */
export function CarrierProfileChart({
  profiles,
  edgeNm = null,
  width,
  height,
  carrier,
  scaleError = null,
  description,
}: {
  profiles: readonly ProfileSeries[];
  edgeNm?: number | null;
  width: number;
  height: number;
  carrier: 'electrons' | 'holes';
  scaleError?: number | null;
  description?: string;
}) {
  const deepest = Math.max(1, ...profiles.map((one) => one.profile.points.at(-1)?.depthNm ?? 0));
  const [left, right] = [LEFT, Math.max(LEFT + 40, width - 16)];
  const x = scaleLinear().domain([0, deepest]).range([left, right]);
  const scale = carrierScale(profiles, TOP, height - TOP - BOTTOM);
  const unit = scale.logarithmic ? 'cm⁻³' : 'populated share';
  const bottom = height - BOTTOM;
  const sentence =
    description ??
    `${carrier} (${unit}) over depth to ${deepest.toFixed(0)} nm: ${profiles.map((one) => one.label).join(', ')}.`;
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={sentence}
    >
      <CarrierPanel
        series={profiles}
        scale={scale}
        x={x}
        top={TOP}
        height={bottom - TOP}
        title={`${carrier} (${unit})`}
        scaleError={scaleError}
      />
      <AxisBottom
        ticks={x
          .ticks(Math.max(3, Math.round((right - left) / 70)))
          .map((depth) => ({ position: x(depth), label: `${depth}` }))}
        at={bottom}
        grid={0}
      />
      <line x1={left} x2={right} y1={bottom} y2={bottom} stroke="var(--ink-3)" />
      <AxisTitle x={(left + right) / 2} y={height - 8} anchor="middle">
        depth below the semiconductor surface (nm)
      </AxisTitle>
      {edgeNm !== null && (
        <line
          x1={x(edgeNm)}
          x2={x(edgeNm)}
          y1={TOP}
          y2={bottom}
          stroke="var(--ink)"
          strokeWidth={1.25}
        />
      )}
    </svg>
  );
}
