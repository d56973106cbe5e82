import type { FigureTable } from '@/components/charts/figure-table';
import type { Residual, CarrierProfile } from '@/lib/inversion/index';

/** Numbers behind the scan and its residuals. */
export function scanFitTable(residuals: readonly Residual[]): FigureTable {
  return {
    columns: [
      'energy (keV)',
      'observed',
      'σ',
      'folded',
      'residual / σ',
      'used',
      'stopping profile',
    ],
    rows: residuals.map((residual) => [
      residual.energyKeV,
      residual.observed,
      residual.sigma,
      residual.predicted,
      residual.reduced,
      residual.enabled ? 'yes' : 'switched off',
      residual.interpolated ? 'interpolated' : 'from file',
    ]),
  };
}

/** Numbers behind a carrier profile. */
export function carrierTable({ unit, points }: CarrierProfile): FigureTable {
  return {
    columns: ['depth (nm)', unit, 'lower 68 %', 'upper 68 %', 'lower 95 %', 'upper 95 %', 'flag'],
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
