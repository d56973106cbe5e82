import { OBSERVABLE_LABEL } from '@/components/charts/chart-types';
import type { FigureTable } from '@/components/charts/figure-table';
import type { CarrierProfile, Observable, Residual, ScanPoint } from '@/lib/inversion/index';

/** The scan with what was folded for it; residuals are blank before a fit. */
export function scanTable(
  points: readonly ScanPoint[],
  residuals: readonly Residual[] | null,
  observable: Observable,
): FigureTable {
  return {
    columns: [
      'energy (keV)',
      OBSERVABLE_LABEL[observable],
      'σ',
      'folded fit',
      'residual / σ',
      'in use',
      'stopping profile',
    ],
    rows: points.map((point) => {
      const residual = residuals?.find(({ energyKeV }) => energyKeV === point.energyKeV) ?? null;
      return [
        point.energyKeV,
        point.value,
        point.sigma,
        residual?.predicted ?? null,
        residual?.reduced ?? null,
        point.enabled ? 'yes' : 'no',
        residual === null ? null : residual.interpolated ? 'interpolated' : 'given',
      ];
    }),
  };
}

export function depthTable({ points, unit }: CarrierProfile, carrier: string): FigureTable {
  const of = unit === 'cm⁻³' ? `${carrier} (cm⁻³)` : 'populated share';
  return {
    columns: [
      'depth (nm)',
      of,
      'lower 68 %',
      'upper 68 %',
      'lower 95 %',
      'upper 95 %',
      'what the scan says',
    ],
    rows: points.map((point) => [
      point.depthNm,
      point.value,
      point.lower68,
      point.upper68,
      point.lower95,
      point.upper95,
      point.flag,
    ]),
  };
}
