import { scaleLinear } from 'd3';

import { AxisBottom, AxisTitle } from '@/components/charts/axis';
import { CarrierPanel } from '@/components/charts/carrier-panel';
import { carrierScale } from '@/components/charts/carrier-scale';
import type { CarrierProfile } from '@/lib/inversion/index';

import type { FitMark } from './fit-mark';
import { LetterMarks, valueAt, type LetterPlace } from './letter-marks';

export interface MarkedProfile {
  mark: FitMark;
  name: string;
  profile: CarrierProfile;
}

const MARGIN = { top: 28, right: 16, bottom: 46, left: 54 };

/** Carrier profiles of several fits over each other; the first carries its bands, each line its letter. */
export function CompareProfileChart({
  profiles,
  carrier,
  width,
  height,
}: {
  profiles: readonly MarkedProfile[];
  carrier: 'electrons' | 'holes';
  width: number;
  height: number;
}) {
  const deepest = Math.max(
    1,
    ...profiles.map(({ profile }) => profile.points.at(-1)?.depthNm ?? 0),
  );
  const [left, right] = [MARGIN.left, Math.max(MARGIN.left + 40, width - MARGIN.right)];
  const bottom = height - MARGIN.bottom;
  const x = scaleLinear().domain([0, deepest]).range([left, right]);
  const series = profiles.map(({ mark, profile }) => ({
    label: mark.letter,
    style: mark.style,
    colour: mark.colour,
    profile,
  }));
  const scale = carrierScale(series, MARGIN.top, bottom - MARGIN.top);
  const unit = scale.logarithmic ? 'cm⁻³' : 'populated share';
  const places = profiles.map(({ mark, profile }, index): LetterPlace => {
    const depth = (deepest * (index + 0.6)) / (profiles.length + 0.2);
    const value = valueAt(
      profile.points.map((point) => point.depthNm),
      profile.points.map((point) => point.value),
      depth,
    );
    const y = scale.y(scale.logarithmic ? Math.max(value, scale.lowest) : value);
    return { ...mark, x: x(depth), y: Math.min(Math.max(y, MARGIN.top + 9), bottom - 9) };
  });
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={`${carrier} (${unit}) over depth to ${deepest.toFixed(0)} nm: ${profiles.map((one) => `${one.mark.letter} ${one.name}`).join(', ')}.`}
    >
      <CarrierPanel
        series={series}
        scale={scale}
        x={x}
        top={MARGIN.top}
        height={bottom - MARGIN.top}
        title={`${carrier} (${unit})`}
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
      <LetterMarks places={places.filter((place) => Number.isFinite(place.y))} />
    </svg>
  );
}
