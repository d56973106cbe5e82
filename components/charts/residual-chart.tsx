import { scaleLinear } from 'd3';

import { AxisLeft, AxisTitle } from './axis';
import { strokeOf, type ResidualSeries } from './chart-types';
import { energyScale } from './scan-layout';

const TOP = 24;
const BOTTOM = 8;

/** Residuals over σ under the scan: bars for the fit, hollow circles for the models compared with. */
export function ResidualChart({
  series,
  energiesKeV = [],
  width,
  height,
  highlightedKeV = null,
  description,
}: {
  series: readonly ResidualSeries[];
  /** Energies of the scan above, where the residuals do not name them all. */
  energiesKeV?: readonly number[];
  width: number;
  height: number;
  highlightedKeV?: number | null;
  description?: string;
}) {
  const energies = [
    ...energiesKeV,
    ...series.flatMap((one) => one.residuals.map((residual) => residual.energyKeV)),
  ];
  const x = energyScale(energies, width);
  const largest =
    Math.max(
      2.4,
      ...series.flatMap((one) => one.residuals.map((residual) => Math.abs(residual.reduced))),
    ) * 1.08;
  const y = scaleLinear()
    .domain([-largest, largest])
    .range([height - BOTTOM, TOP]);
  const [left, right] = x.range() as [number, number];
  const marks = largest > 6 ? y.ticks(4) : [-2, 0, 2];
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={description ?? sentence(series)}
    >
      <AxisTitle x={left} y={12} anchor="start">
        residual / σ
      </AxisTitle>
      <AxisLeft
        ticks={marks.map((mark) => ({
          position: y(mark),
          label: mark > 0 ? `+${mark}` : `${mark}`.replace('-', '−'),
        }))}
        at={left}
        grid={right - left}
      />
      <line x1={left} x2={right} y1={y(0)} y2={y(0)} stroke="var(--ink-3)" />
      {series.map((one, index) => (
        <g key={one.label}>
          {one.residuals.map((residual) => {
            const lit = highlightedKeV === residual.energyKeV;
            const [px, py] = [x(residual.energyKeV), y(residual.reduced)];
            if (index > 0)
              return (
                <circle
                  key={residual.energyKeV}
                  cx={px + 5}
                  cy={py}
                  r={3.2}
                  fill="var(--paper)"
                  stroke={strokeOf(one)}
                  strokeWidth={1.4}
                />
              );
            return (
              <rect
                key={residual.energyKeV}
                x={px - (lit ? 5 : 3.5)}
                width={lit ? 10 : 7}
                y={Math.min(py, y(0))}
                height={Math.max(1, Math.abs(py - y(0)))}
                fill={residual.enabled ? strokeOf(one) : 'var(--paper)'}
                fillOpacity={lit ? 1 : 0.85}
                stroke={residual.enabled ? (lit ? 'var(--ink)' : 'none') : strokeOf(one)}
              />
            );
          })}
        </g>
      ))}
    </svg>
  );
}

function sentence(series: readonly ResidualSeries[]): string {
  const worst = series[0]?.residuals.reduce<{ energyKeV: number; reduced: number } | null>(
    (most, residual) =>
      residual.enabled && Math.abs(residual.reduced) > Math.abs(most?.reduced ?? 0)
        ? residual
        : most,
    null,
  );
  if (!worst) return 'Residuals over σ.';
  return `Residuals over σ; the largest of ${series[0]?.label} is ${worst.reduced.toFixed(1)} at ${worst.energyKeV} keV.`;
}
