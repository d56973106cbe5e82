import { AxisBottom, AxisTitle, SANS } from './axis';
import { CarrierPanel } from './carrier-panel';
import { carrierScale } from './carrier-scale';
import type { DepthInformation, ProfileSeries, Ridge } from './chart-types';
import { depthLayout } from './depth-layout';
import { ReachStrip } from './reach-strip';
import { RidgelinePanel } from './ridgeline-panel';

export interface DepthFigureProps {
  ridges: readonly Ridge[];
  profiles: readonly ProfileSeries[];
  information: DepthInformation | null;
  edgeNm: number | null;
  edgeLabel?: string;
  /** 68 % interval of the edge, drawn as a bar on the reach strip. */
  edgeInterval?: readonly [number | null, number | null];
  carrier: 'electrons' | 'holes';
  depthScale?: number;
  capThicknessNm?: number;
  maxDepthNm: number;
  scaleError?: number | null;
  highlightedKeV?: number | null;
  speakingKeV?: readonly number[] | null;
  /** One sentence that says what the figure shows. */
  description: string;
  width: number;
  height: number;
}

/** Stopping profiles, carriers and reach over one depth axis that counts from the semiconductor surface. */
export function DepthFigure(props: DepthFigureProps) {
  const { ridges, profiles, edgeNm, capThicknessNm = 0, width, height, maxDepthNm } = props;
  const layout = depthLayout({ width, height, capThicknessNm, maxDepthNm });
  const { x, left, right } = layout;
  const scale = carrierScale(profiles, layout.carriers.top, layout.carriers.height);
  const unit = scale.logarithmic ? 'cm⁻³' : 'populated share';
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={props.description}
    >
      {capThicknessNm > 0 && (
        <Cap from={left} to={x(0)} top={layout.ridges.top} bottom={layout.axisY} />
      )}
      <RidgelinePanel
        ridges={ridges}
        x={x}
        {...layout.ridges}
        depthScale={props.depthScale}
        capThicknessNm={capThicknessNm}
        highlightedKeV={props.highlightedKeV}
        speakingKeV={props.speakingKeV}
      />
      <CarrierPanel
        series={profiles}
        scale={scale}
        x={x}
        {...layout.carriers}
        title={profiles.length === 0 ? props.carrier : `${props.carrier} (${unit})`}
        scaleError={props.scaleError}
      />
      <ReachStrip information={props.information} x={x} {...layout.strip} />
      <AxisBottom
        ticks={x
          .ticks(Math.max(3, Math.round((right - left) / 70)))
          .map((depth) => ({ position: x(depth), label: `${depth}` }))}
        at={layout.axisY}
        grid={0}
      />
      <AxisTitle x={(left + right) / 2} y={height - 8} anchor="middle">
        depth below the semiconductor surface (nm)
      </AxisTitle>
      {edgeNm !== null && (
        <Edge
          {...props}
          at={x(edgeNm)}
          bounds={[left, right]}
          top={layout.ridges.top}
          bottom={layout.axisY}
          stripTop={layout.strip.top}
          labelY={layout.carriers.top + layout.carriers.height - 12}
          interval={props.edgeInterval?.map((end) => (end === null ? null : x(end))) ?? []}
        />
      )}
    </svg>
  );
}

function Edge({
  at,
  bounds: [left, right],
  top,
  bottom,
  stripTop,
  labelY,
  interval,
  edgeLabel,
}: {
  at: number;
  bounds: readonly [number, number];
  top: number;
  bottom: number;
  stripTop: number;
  labelY: number;
  interval: readonly (number | null)[];
  edgeLabel?: string;
}) {
  const [low, high] = interval;
  const flip = at > left + (right - left) * 0.7;
  return (
    <g>
      <line x1={at} x2={at} y1={top} y2={bottom} stroke="var(--ink)" strokeWidth={1.25} />
      {low !== undefined && (
        <line
          x1={Math.max(left, low ?? left)}
          x2={Math.min(right, high ?? right)}
          y1={stripTop + 6}
          y2={stripTop + 6}
          stroke="var(--ink)"
          strokeWidth={4}
        />
      )}
      {edgeLabel !== undefined && (
        <text
          x={at + (flip ? -12 : 12)}
          y={labelY}
          textAnchor={flip ? 'end' : 'start'}
          fill="var(--ink)"
          stroke="var(--paper)"
          strokeWidth={4}
          paintOrder="stroke"
          fontFamily={SANS}
          fontSize={12}
          fontWeight={600}
        >
          {edgeLabel}
        </text>
      )}
    </g>
  );
}

/** The cap layer: its stops see no carriers of the semiconductor. */
function Cap({ from, to, top, bottom }: { from: number; to: number; top: number; bottom: number }) {
  return (
    <g>
      <rect
        x={from}
        y={top}
        width={to - from}
        height={bottom - top}
        fill="var(--rule)"
        fillOpacity={0.5}
      />
      {to - from > 24 && (
        <text
          x={(from + to) / 2}
          y={bottom - 30}
          textAnchor="middle"
          fill="var(--ink-2)"
          fontFamily={SANS}
          fontSize={11.5}
        >
          cap
        </text>
      )}
    </g>
  );
}
