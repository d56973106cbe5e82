import { scaleLinear } from 'd3';

import { AxisBottom, AxisLeft, AxisTitle, SANS } from '@/components/charts/axis';
import { energyScale } from '@/components/charts/scan-layout';
import type { Residual } from '@/lib/inversion/index';

import type { FitMark } from './fit-mark';

export interface MarkedResiduals {
  mark: FitMark;
  name: string;
  residuals: readonly Residual[];
}

const TOP = 22;
const ROW = 74;
const BOTTOM = 42;

export const residualRowsHeight = (fits: number): number => TOP + fits * ROW + BOTTOM;

/** Residuals over σ, one row per fit on one scale, so that rows can be held against each other. */
export function ResidualRows({ rows, width }: { rows: readonly MarkedResiduals[]; width: number }) {
  const height = residualRowsHeight(rows.length);
  const all = rows.flatMap((row) => row.residuals);
  const x = energyScale(
    all.map((residual) => residual.energyKeV),
    width,
  );
  const largest = Math.max(2.4, ...all.map((residual) => Math.abs(residual.reduced))) * 1.08;
  const [left, right] = x.range() as [number, number];
  const bottom = height - BOTTOM;
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={`Residuals over σ of ${rows.map(worst).join('; ')}.`}
    >
      <AxisTitle x={left} y={12} anchor="start">
        residual / σ
      </AxisTitle>
      {rows.map((row, index) => (
        <Row
          key={row.mark.letter}
          row={row}
          x={x}
          y={scaleLinear()
            .domain([-largest, largest])
            .range([TOP + (index + 1) * ROW - 6, TOP + index * ROW + 6])}
          ends={[left, right]}
        />
      ))}
      <AxisBottom
        ticks={x.ticks(6).map((value) => ({ position: x(value), label: `${value}` }))}
        at={bottom}
        grid={0}
      />
      <line x1={left} x2={right} y1={bottom} y2={bottom} stroke="var(--ink-3)" />
      <AxisTitle x={(left + right) / 2} y={height - 6} anchor="middle">
        implantation energy (keV)
      </AxisTitle>
    </svg>
  );
}

type Scale = (value: number) => number;

function Row({
  row: { mark, residuals },
  x,
  y,
  ends: [left, right],
}: {
  row: MarkedResiduals;
  x: Scale;
  y: Scale;
  ends: readonly [number, number];
}) {
  return (
    <g>
      <AxisLeft
        ticks={[-2, 0, 2].map((level) => ({
          position: y(level),
          label: level === 0 ? '0' : level > 0 ? `+${level}` : `−${-level}`,
        }))}
        at={left}
        grid={right - left}
      />
      <line x1={left} x2={right} y1={y(0)} y2={y(0)} stroke="var(--ink-3)" />
      {residuals.map((residual) => (
        <rect
          key={residual.energyKeV}
          x={x(residual.energyKeV) - 3.5}
          width={7}
          y={Math.min(y(residual.reduced), y(0))}
          height={Math.max(1, Math.abs(y(residual.reduced) - y(0)))}
          fill={residual.enabled ? mark.colour : 'var(--paper)'}
          stroke={mark.colour}
        />
      ))}
      <text x={12} y={y(0) + 4} fill="var(--ink)" fontFamily={SANS} fontSize={12} fontWeight={600}>
        {mark.letter}
      </text>
    </g>
  );
}

function worst({ mark, name, residuals }: MarkedResiduals): string {
  const used = residuals.filter((residual) => residual.enabled);
  const most = used.toSorted((a, b) => Math.abs(b.reduced) - Math.abs(a.reduced))[0];
  const largest = most ? `, largest ${most.reduced.toFixed(1)} at ${most.energyKeV} keV` : '';
  return `${mark.letter} ${name}${largest}`;
}
