import type { ScanPoint } from '@/lib/inversion/index';
import type { ScanState } from './scan-states';
import type { DemoScan } from './types';

const DELIMITER = { comma: ',', semicolon: ';', blanks: '   ' } as const;
const HEADINGS = {
  fraction: ['energy_keV', 'diamagnetic_fraction', 'sigma'],
  rate: ['energy_keV', 'capture_rate_per_us', 'sigma_per_us'],
} as const;
const FIRST_RUN = 1001;

/** The file of a scan as the beam line's people would have written it, and how it is read back. */
export function scanFile(
  { key, dress, observable }: ScanState,
  points: readonly ScanPoint[],
): Pick<DemoScan, 'file' | 'reading'> {
  const decimal = dress === 'semicolon' ? 'comma' : 'point';
  const number = (value: number) =>
    decimal === 'comma' ? String(value).replace('.', ',') : String(value);
  const rows = points.map(({ energyKeV, value, sigma }, index) => [
    ...[energyKeV, Number(value.toFixed(4)), sigma].map(number),
    `R${FIRST_RUN + index}`,
  ]);
  const table = [[...HEADINGS[observable], 'run'], ...rows].map((row) =>
    row.join(DELIMITER[dress]),
  );
  const text = ['# invented numbers of the demo team', ...table, ''].join('\n');
  return {
    file: { fileName: `${key}.${dress === 'blanks' ? 'txt' : 'csv'}`, text },
    reading: {
      delimiter: dress,
      decimal,
      columns: { energy: 0, value: 1, sigma: 2, note: 3, counts: null },
      energyUnit: 'keV',
      asymmetry: null,
      skipLines: [],
    },
  };
}
