'use client';

import { Figure } from '@/components/charts/figure';
import { ScanChart } from '@/components/charts/scan-chart';
import type { ScanPoint } from '@/lib/inversion/index';
import type { Scan } from '@/lib/schemas/scan';

interface ScanFigureProps {
  points: readonly ScanPoint[];
  observable: Scan['observable'];
  title: string;
}

const HEIGHT = 300;

/** The points of a scan before any fit: filled when used, hollow when switched off. */
export function ScanFigure({ points, observable, title }: ScanFigureProps) {
  const marks = points.map(({ energyKeV, value, sigma, enabled }) => ({
    energyKeV,
    observed: value,
    sigma,
    enabled,
    interpolated: false,
  }));
  const valueName = observable === 'rate' ? 'capture rate (µs⁻¹)' : 'diamagnetic fraction';
  return (
    <Figure
      title={title}
      svgName="energy-scan"
      height={HEIGHT}
      table={{
        columns: ['energy (keV)', valueName, 'σ', 'used'],
        rows: points.map(({ energyKeV, value, sigma, enabled }) => [
          energyKeV,
          value,
          sigma,
          enabled ? 'yes' : 'no',
        ]),
      }}
    >
      {(width) => (
        <ScanChart
          residuals={marks}
          curves={[]}
          observable={observable}
          width={width}
          height={HEIGHT}
        />
      )}
    </Figure>
  );
}
