import { area, line, type ScaleLinear } from 'd3';

import type { CarrierProfile, ProfilePoint } from '@/lib/inversion/index';

import { AxisLeft, AxisTitle, SANS } from './axis';
import type { CarrierScale } from './carrier-scale';
import { dashOf, strokeOf, type ProfileSeries } from './chart-types';
import { Hatch } from './hatch';
import { Legend, legendWidth } from './legend';

interface CarrierPanelProps {
  series: readonly ProfileSeries[];
  scale: CarrierScale;
  x: ScaleLinear<number, number>;
  top: number;
  height: number;
  /** The name of the axis with its unit. */
  title: string;
  /** Relative uncertainty of the capture coefficient: it moves the whole profile and is no part of the bands. */
  scaleError?: number | null;
}

/** Carriers against depth: bands of the first profile, every profile as a line, hatching where the scan says nothing. */
export function CarrierPanel({
  series,
  scale,
  x,
  top,
  height,
  title,
  scaleError = null,
}: CarrierPanelProps) {
  const [left, right] = x.range() as [number, number];
  const first = series[0]?.profile ?? null;
  const entries = legendOf(series);
  const fits = legendWidth(entries) + title.length * 7 < right - left;
  return (
    <g>
      <AxisTitle x={left} y={top - 9} anchor="start">
        {title}
      </AxisTitle>
      <Legend entries={entries} right={right} y={fits ? top - 9 : top - 27} />
      {first === null && (
        <HatchLabel x={(left + right) / 2} y={top + height / 2}>
          The carriers follow from the fit.
        </HatchLabel>
      )}
      <AxisLeft ticks={first === null ? [] : scale.ticks} at={left} grid={right - left} />
      {first && <Unknown profile={first} scale={scale} x={x} top={top} height={height} />}
      {/* A nested svg clips what leaves the panel and needs no id. */}
      <svg x={left} y={top} width={right - left} height={height} overflow="hidden">
        <g transform={`translate(${-left} ${-top})`}>
          {series.slice(0, 1).map((one) => (
            <Bands key={one.label} one={one} scale={scale} x={x} />
          ))}
          {[...series].reverse().map((one) => (
            <ProfileLine key={one.label} one={one} scale={scale} x={x} />
          ))}
        </g>
      </svg>
      {first && scaleError !== null && (
        <ScaleErrorBar profile={first} scale={scale} x={right} relative={scaleError} />
      )}
    </g>
  );
}

type PanelScales = { scale: CarrierScale; x: ScaleLinear<number, number> };

/** Height of a value; zero and below go under the panel, where the clip hides them. */
function heightOf({ y, lowest, logarithmic }: CarrierScale): (value: number) => number {
  return (value) => y(logarithmic ? Math.max(value, lowest / 3) : value);
}

function Bands({ one, scale, x }: { one: ProfileSeries } & PanelScales) {
  const height = heightOf(scale);
  const band = (lower: 'lower68' | 'lower95', upper: 'upper68' | 'upper95') =>
    area<ProfilePoint>()
      .defined((p) => p[lower] !== null && p[upper] !== null)
      .x((p) => x(p.depthNm))
      .y0((p) => height(p[lower] ?? 0))
      .y1((p) => height(p[upper] ?? 0))([...one.profile.points]) ?? '';
  return (
    <g fill={strokeOf(one)}>
      <path d={band('lower95', 'upper95')} fillOpacity={0.16} />
      <path d={band('lower68', 'upper68')} fillOpacity={0.26} />
    </g>
  );
}

function ProfileLine({ one, scale, x }: { one: ProfileSeries } & PanelScales) {
  const height = heightOf(scale);
  const path = line<ProfilePoint>()
    .x((p) => x(p.depthNm))
    .y((p) => height(p.value))([...one.profile.points]);
  const width = one.style === 'solid' ? 2.25 : 1.6;
  return (
    <path
      d={path ?? ''}
      fill="none"
      stroke={strokeOf(one)}
      strokeWidth={width}
      strokeDasharray={dashOf(one.style)}
      strokeLinejoin="round"
    />
  );
}

/** Hatching beyond reach and below the floor, each with its words. */
function Unknown({
  profile,
  scale,
  x,
  top,
  height,
}: { profile: CarrierProfile; top: number; height: number } & PanelScales) {
  const [left, right] = x.range() as [number, number];
  const reach = Math.max(left, Math.min(right, x(profile.reachNm)));
  const spans = spansBelowFloor(profile);
  const floorY =
    profile.floor === null
      ? top + height
      : Math.max(top, Math.min(top + height, scale.y(Math.max(profile.floor, scale.lowest))));
  return (
    <g>
      <Hatch x={reach} y={top} width={right - reach} height={height} />
      {right - reach > 84 && (
        <HatchLabel x={(reach + right) / 2} y={top + height - 12}>
          beyond reach
        </HatchLabel>
      )}
      {right - reach > 12 && right - reach <= 84 && (
        <HatchLabel x={right - 2} y={top + height - 30} anchor="end">
          beyond reach
        </HatchLabel>
      )}
      {spans.map(([from, to]) => {
        const width = Math.min(x(to), reach) - x(from);
        const room = top + height - floorY;
        return (
          <g key={from}>
            <Hatch x={x(from)} y={floorY} width={width} height={room} />
            {floorLines(width, room).map((line, index) => (
              <HatchLabel key={line} x={x(from) + 8} y={floorY + 18 + index * 15} anchor="start">
                {line}
              </HatchLabel>
            ))}
          </g>
        );
      })}
    </g>
  );
}

/** The words in one line, in two where the span is narrow, none where they would not fit. */
function floorLines(width: number, room: number): string[] {
  if (width > 96 && room > 24) return ['below the floor'];
  return width > 62 && room > 40 ? ['below', 'the floor'] : [];
}

/** Depth spans in which the profile is flagged as below the floor. */
function spansBelowFloor({ points }: CarrierProfile): [number, number][] {
  const spans: [number, number][] = [];
  points.forEach((point, index) => {
    if (point.flag !== 'below floor') return;
    const last = spans.at(-1);
    const next = points[index + 1]?.depthNm ?? point.depthNm;
    if (last && last[1] >= point.depthNm) last[1] = next;
    else spans.push([point.depthNm, next]);
  });
  return spans;
}

function HatchLabel({
  x,
  y,
  anchor = 'middle',
  children,
}: {
  x: number;
  y: number;
  anchor?: 'start' | 'middle' | 'end';
  children: string;
}) {
  return (
    <text
      x={x}
      y={y}
      textAnchor={anchor}
      fill="var(--ink-2)"
      stroke="var(--paper)"
      strokeWidth={4}
      paintOrder="stroke"
      fontFamily={SANS}
      fontSize={11.5}
    >
      {children}
    </text>
  );
}

/** A bar at the deep end: by how much the whole profile may move with the capture coefficient. */
function ScaleErrorBar({
  profile,
  scale,
  x,
  relative,
}: {
  profile: CarrierProfile;
  scale: CarrierScale;
  x: number;
  relative: number;
}) {
  const height = heightOf(scale);
  const value = profile.points.at(-1)?.value ?? 0;
  if (!(value > 0)) return null;
  const [low, high] = [height(value * Math.max(0, 1 - relative)), height(value * (1 + relative))];
  return (
    <path
      d={`M${x + 2} ${low}H${x + 10}M${x + 6} ${low}V${high}M${x + 2} ${high}H${x + 10}`}
      stroke="var(--ink)"
      strokeWidth={1.4}
      fill="none"
    >
      <title>{`Scale error of the capture coefficient, ±${(relative * 100).toFixed(0)} %: moves the whole profile, not in the bands`}</title>
    </path>
  );
}

/** The first profile carries the bands, and its name says so. */
function legendOf(series: readonly ProfileSeries[]) {
  return series.map((one, index) =>
    index === 0 && one.profile.bands !== null
      ? { ...one, label: `${one.label}, 68 % and 95 %` }
      : one,
  );
}
