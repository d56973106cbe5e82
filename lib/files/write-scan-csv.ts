import type { Observable, ScanPoint } from '@/lib/inversion/index';
import { csvText, type HeadLine } from './csv-text';

export interface ScanCsvInput {
  head: readonly HeadLine[];
  observable: Observable;
  points: readonly (ScanPoint & { note?: string | null })[];
}

const HEADINGS = {
  fraction: ['diamagnetic_fraction', 'sigma'],
  rate: ['capture_rate_per_us', 'sigma_per_us'],
} as const;

/** An energy scan as CSV that the scan reader takes back; points that are switched off say so. */
export function scanCsv({ head, observable, points }: ScanCsvInput): string {
  const columns = ['energy_keV', ...HEADINGS[observable], 'note'];
  const rows = points.map(({ energyKeV, value, sigma, enabled, note }) => [
    energyKeV,
    value,
    sigma,
    [enabled ? '' : 'switched off', note ?? ''].filter((text) => text !== '').join(': '),
  ]);
  return csvText(head, columns, rows);
}
