import { describe, expect, it } from 'vitest';
import { guessScanColumns, readScan } from '@/lib/files/scan-file';
import { guessStoppingLayout, readStoppingFiles } from '@/lib/files/stopping-file';
import {
  oneEnergyStoppingTemplate,
  rateScanTemplate,
  scanTemplate,
  stoppingMatrixTemplate,
  type FileTemplate,
} from '@/lib/files/templates';
import { tableOf } from '../support/fixture';

const asTable = ({ fileName, text }: FileTemplate) => tableOf(text, fileName);

describe('templates', () => {
  it.each([
    ['fraction', scanTemplate()],
    ['rate', rateScanTemplate()],
  ] as const)('of a %s scan are read without a problem', (observable, template) => {
    const table = asTable(template);
    const columns = guessScanColumns(table);
    expect(columns).toMatchObject({ energy: 0, value: 1, sigma: 2, note: 3 });
    const reading = columns && readScan(table, columns, { observable, energyUnit: 'keV' });
    expect(reading?.problems).toEqual([]);
    expect(reading?.points).toHaveLength(9);
  });

  it.each([
    [9, stoppingMatrixTemplate()],
    [1, oneEnergyStoppingTemplate()],
  ])(
    'of stopping profiles for %d energies are read without a problem or a warning',
    (energies, template) => {
      const tables = [asTable(template)];
      const { set, problems, warnings } = readStoppingFiles(tables, guessStoppingLayout(tables));
      expect([problems, warnings]).toEqual([[], []]);
      expect(set?.profiles).toHaveLength(energies);
    },
  );

  it('say that their numbers are invented', () => {
    for (const template of [
      scanTemplate(),
      rateScanTemplate(),
      stoppingMatrixTemplate(),
      oneEnergyStoppingTemplate(),
    ]) {
      expect(template.text.split('\r\n')[0]).toContain('invented numbers');
    }
  });
});
