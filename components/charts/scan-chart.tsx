import { line } from 'd3';

import type { Observable } from '@/lib/inversion/index';

import { AxisBottom, AxisLeft, AxisTitle } from './axis';
import { dashOf, OBSERVABLE_LABEL, strokeOf, type ScanCurve, type ScanMark } from './chart-types';
import { energyColour, energyRange } from './energy-colour';
import { Legend } from './legend';
import { scanLayout, type ScanLayout } from './scan-layout';

export interface ScanChartProps {
  /** Points of the scan; `Residual`s of a fit will do. */
  residuals: readonly ScanMark[];
  curves: readonly ScanCurve[];
  observable: Observable;
  width: number;
  height: number;
  keep?: readonly number[];
  highlightedKeV?: number | null;
  /** Energies that speak about the depth under the pointer. */
  speakingKeV?: readonly number[] | null;
  /** A curve drawn by hand: over the others, and without a say in the vertical scale, which would run away under the pointer. */
  drawn?: ScanCurve | null;
  description?: string;
}

/** The energy scan: points with their σ in the colour of their energy, folded curves through them. */
export function ScanChart({
  residuals: marks,
  curves,
  observable,
  width,
  height,
  keep,
  highlightedKeV = null,
  speakingKeV = null,
  drawn = null,
  description,
}: ScanChartProps) {
  const layout = scanLayout({ marks, curves, width, height, keep });
  const { x, y, left, right, top, bottom } = layout;
  const all = drawn ? [...curves, drawn] : curves;
  const range = energyRange(marks.map((mark) => mark.energyKeV));
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={description ?? sentence(marks, curves, observable)}
    >
      <AxisTitle x={left} y={14} anchor="start">
        {OBSERVABLE_LABEL[observable]}
      </AxisTitle>
      <AxisLeft
        ticks={y.ticks(6).map((value) => ({ position: y(value), label: y.tickFormat(6)(value) }))}
        at={left}
        grid={right - left}
      />
      <AxisBottom
        ticks={x.ticks(6).map((value) => ({ position: x(value), label: `${value}` }))}
        at={bottom}
        grid={0}
      />
      <line x1={left} x2={right} y1={bottom} y2={bottom} stroke="var(--ink-3)" />
      <AxisTitle x={(left + right) / 2} y={height - 8} anchor="middle">
        implantation energy (keV)
      </AxisTitle>
      <Legend entries={all} right={right} y={34} />
      {/* A nested svg clips a drawn curve that leaves the panel. */}
      <svg x={left} y={top} width={right - left} height={bottom - top} overflow="hidden">
        <g transform={`translate(${-left} ${-top})`}>
          {[...curves].reverse().map((curve) => (
            <CurveLine key={curve.label} curve={curve} layout={layout} />
          ))}
          {drawn && <CurveLine curve={drawn} layout={layout} />}
        </g>
      </svg>
      {marks.map((mark) => (
        <Point
          key={mark.energyKeV}
          mark={mark}
          layout={layout}
          colour={energyColour(mark.energyKeV, range)}
          lit={
            highlightedKeV === mark.energyKeV || (speakingKeV?.includes(mark.energyKeV) ?? false)
          }
        />
      ))}
    </svg>
  );
}

function CurveLine({ curve, layout }: { curve: ScanCurve; layout: ScanLayout }) {
  return (
    <path
      d={curvePath(curve, layout)}
      fill="none"
      stroke={strokeOf(curve)}
      strokeWidth={curve.style === 'solid' ? 2.25 : 1.6}
      strokeDasharray={dashOf(curve.style)}
    />
  );
}

function curvePath(
  { energiesKeV, values }: Pick<ScanCurve, 'energiesKeV' | 'values'>,
  { x, y }: ScanLayout,
): string {
  const indices = Array.from({ length: energiesKeV.length }, (_, index) => index);
  return (
    line<number>()
      .defined((i) => Number.isFinite(values[i]))
      .x((i) => x(energiesKeV[i]!))
      .y((i) => y(values[i]!))(indices) ?? ''
  );
}

function Point({
  mark,
  layout: { x, y, bottom },
  colour,
  lit,
}: {
  mark: ScanMark;
  layout: ScanLayout;
  colour: string;
  lit: boolean;
}) {
  const [cx, cy] = [x(mark.energyKeV), y(mark.observed)];
  return (
    <g>
      {lit && <circle cx={cx} cy={cy} r={9} fill="none" stroke="var(--ink)" strokeWidth={1.25} />}
      <line
        x1={cx}
        x2={cx}
        y1={y(mark.observed - mark.sigma)}
        y2={y(mark.observed + mark.sigma)}
        stroke={mark.enabled ? 'var(--ink)' : 'var(--ink-3)'}
        strokeDasharray={mark.enabled ? undefined : '2 2'}
      />
      <circle
        cx={cx}
        cy={cy}
        r={4.5}
        fill={mark.enabled ? colour : 'var(--paper)'}
        stroke={mark.enabled ? 'var(--paper)' : colour}
        strokeWidth={mark.enabled ? 1.25 : 1.6}
      />
      {mark.interpolated && (
        <path d={`M${cx - 4} ${bottom - 2}h8l-4 -7z`} fill="none" stroke="var(--ink-2)">
          <title>stopping profile interpolated between its neighbours</title>
        </path>
      )}
    </g>
  );
}

function sentence(
  marks: readonly ScanMark[],
  curves: readonly ScanCurve[],
  observable: Observable,
): string {
  const off = marks.filter((mark) => !mark.enabled).length;
  const energies = marks.map((mark) => mark.energyKeV);
  const span =
    marks.length > 0 ? ` from ${Math.min(...energies)} to ${Math.max(...energies)} keV` : '';
  const drawn =
    curves.length > 0 ? ` with ${curves.map((curve) => curve.label).join(' and ')}` : '';
  return `Energy scan of the ${OBSERVABLE_LABEL[observable]}: ${marks.length} points${span}${off > 0 ? `, ${off} switched off` : ''}${drawn}.`;
}
