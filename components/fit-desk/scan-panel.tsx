'use client';

import { memo, useMemo } from 'react';

import type { ResidualSeries, ScanCurve, ScanMark } from '@/components/charts/chart-types';
import { Figure } from '@/components/charts/figure';
import { ResidualChart } from '@/components/charts/residual-chart';
import { ScanChart } from '@/components/charts/scan-chart';
import { scanLayout } from '@/components/charts/scan-layout';
import type { Observable, Residual, ScanPoint } from '@/lib/inversion/index';

import type { Drawable } from './drawn-values';
import { scanTable } from './figure-tables';
import { ScanOverlay, type LevelHandle } from './scan-overlay';
import { ScanPointTable } from './scan-point-table';

const SCAN_HEIGHT = 320;
const RESIDUAL_HEIGHT = 118;
const NO_HANDLES: readonly LevelHandle[] = [];

interface ScanPanelProps {
  points: readonly ScanPoint[];
  /** Energies whose stopping profile is interpolated. */
  interpolatedKeV: readonly number[];
  offInScan: ReadonlySet<number>;
  observable: Observable;
  curves: readonly ScanCurve[];
  drawnCurve: ScanCurve | null;
  /** The fit first, then what it is compared with. */
  residuals: readonly ResidualSeries[];
  /** Levels of the fit, kept inside the picture. */
  keep: readonly number[];
  highlightedKeV: number | null;
  speakingKeV: readonly number[] | null;
  onReadEnergy: (energyKeV: number | null) => void;
  /** null on a saved fit. */
  edit: null | {
    levels: readonly LevelHandle[];
    onToggle: (energyKeV: number) => void;
    onMove: (name: Drawable, value: number) => void;
    onDrop: (name: Drawable) => void;
    onClear: () => void;
  };
  svgName: string;
}

/** What was measured: the scan with its folded curves, and the residuals under it. */
export function ScanPanel(props: ScanPanelProps) {
  const { points, interpolatedKeV, observable, curves, residuals, edit, keep } = props;
  const marks = useMemo<ScanMark[]>(
    () =>
      points.map(({ energyKeV, value, sigma, enabled }) => ({
        energyKeV,
        observed: value,
        sigma,
        enabled,
        interpolated: interpolatedKeV.includes(energyKeV),
      })),
    [points, interpolatedKeV],
  );
  const fitted = residuals[0]?.residuals ?? null;
  const unit = observable === 'rate' ? 'µs⁻¹' : '';
  return (
    <div className="grid gap-2">
      <Figure
        title="Energy scan"
        table={scanTable(points, fitted, observable)}
        tableView={
          <ScanPointTable
            points={points}
            residuals={fitted}
            offInScan={props.offInScan}
            onToggle={edit?.onToggle ?? null}
          />
        }
        svgName={`${props.svgName}-scan`}
        height={SCAN_HEIGHT}
      >
        {(width) => (
          <div className="relative">
            <ScanChart
              residuals={marks}
              curves={curves}
              drawn={props.drawnCurve}
              observable={observable}
              keep={keep}
              highlightedKeV={props.highlightedKeV}
              speakingKeV={props.speakingKeV}
              width={width}
              height={SCAN_HEIGHT}
            />
            <ScanOverlay
              layout={scanLayout({ marks, curves, width, height: SCAN_HEIGHT, keep })}
              width={width}
              height={SCAN_HEIGHT}
              points={points}
              offInScan={props.offInScan}
              levels={edit?.levels ?? NO_HANDLES}
              unit={unit}
              onToggle={edit?.onToggle ?? null}
              onReadEnergy={props.onReadEnergy}
              onMove={edit?.onMove ?? ignore}
              onDrop={edit?.onDrop ?? ignore}
              onClear={edit?.onClear ?? ignore}
            />
          </div>
        )}
      </Figure>
      <ResidualFigure
        series={residuals}
        points={points}
        highlightedKeV={props.highlightedKeV}
        svgName={`${props.svgName}-residuals`}
      />
      <p className="min-h-5 text-[0.8125rem] text-ink-2">
        {readingOf(props.highlightedKeV, points, fitted, edit !== null, unit)}
      </p>
    </div>
  );
}

/** Not drawn anew while a handle moves. */
const ResidualFigure = memo(function ResidualFigure({
  series,
  points,
  highlightedKeV,
  svgName,
}: {
  series: readonly ResidualSeries[];
  points: readonly ScanPoint[];
  highlightedKeV: number | null;
  svgName: string;
}) {
  return (
    <Figure
      title="Residuals"
      table={residualTable(series)}
      svgName={svgName}
      height={RESIDUAL_HEIGHT}
    >
      {(width) => (
        <ResidualChart
          series={series}
          energiesKeV={points.map(({ energyKeV }) => energyKeV)}
          highlightedKeV={highlightedKeV}
          width={width}
          height={RESIDUAL_HEIGHT}
        />
      )}
    </Figure>
  );
});

const ignore = () => {};

function residualTable(series: readonly ResidualSeries[]) {
  const energies = series[0]?.residuals.map(({ energyKeV }) => energyKeV) ?? [];
  return {
    columns: ['energy (keV)', ...series.map(({ label }) => `${label}, residual / σ`)],
    rows: energies.map((energyKeV) => [
      energyKeV,
      ...series.map(
        ({ residuals }) =>
          residuals.find((residual) => residual.energyKeV === energyKeV)?.reduced ?? null,
      ),
    ]),
  };
}

function readingOf(
  energyKeV: number | null,
  points: readonly ScanPoint[],
  residuals: readonly Residual[] | null,
  editable: boolean,
  unit: string,
): string {
  const point = points.find((one) => one.energyKeV === energyKeV);
  if (!point) return editable ? 'Click a point, or press space on it, to switch it off.' : '';
  const residual = residuals?.find((one) => one.energyKeV === energyKeV);
  const fit = residual
    ? `, folded ${residual.predicted.toPrecision(4)}, ${residual.reduced.toFixed(1).replace('-', '−')} σ away`
    : '';
  return `${point.energyKeV} keV: ${point.value.toPrecision(4)} ± ${point.sigma.toPrecision(2)}${unit && ` ${unit}`}${fit}${point.enabled ? '' : ', switched off'}.`;
}
