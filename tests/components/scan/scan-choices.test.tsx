import { describe, expect, it } from 'vitest';

import { NO_CHOICES, previewScan, type ScanChoices } from '@/components/scan/scan-choices';
import { readTable } from '@/lib/files/read-table';
import { guessScanColumns } from '@/lib/files/scan-columns';

function tableOf(text: string) {
  const result = readTable('scan.csv', new TextEncoder().encode(text));
  if (!result.ok) throw new Error('the test needs a readable table');
  return result.table;
}

const CLEAN = 'energy_keV,fraction,sigma\n2,0.742,0.004\n4,0.731,0.004\n6,0.690,0.005\n';
const SWAPPED = 'sigma,fraction,energy_keV\n0.004,0.742,2\n0.004,0.731,4\n';
const BROKEN = 'energy_keV,fraction,sigma\n2,0.742,0.004\n4,abc,0.004\n6,0.690,-1\n8,0.62,0.004\n';

const preview = (
  text: string,
  change: Partial<ScanChoices> = {},
  observable: 'fraction' | 'rate' = 'fraction',
) => {
  const table = tableOf(text);
  return previewScan(table, guessScanColumns(table), { ...NO_CHOICES, ...change }, observable);
};

describe('preview of a scan file', () => {
  it('is ready to send when every row reads', () => {
    const { blocked, sent, reading } = preview(CLEAN);
    expect(blocked).toBeNull();
    expect(reading?.points).toHaveLength(3);
    expect(sent).toEqual({
      delimiter: 'comma',
      decimal: 'point',
      columns: { energy: 0, value: 1, sigma: 2, note: null, counts: null },
      energyUnit: 'keV',
      asymmetry: null,
      skipLines: [],
    });
  });

  it('matches columns by their headings, and takes a correction', () => {
    expect(preview(SWAPPED).match).toMatchObject({ energy: 2, value: 1, sigma: 0 });
    const corrected = preview(CLEAN, { columns: { value: 2, sigma: 1 } });
    expect(corrected.reading?.points[0]).toMatchObject({ value: 0.004, sigma: 0.742 });
  });

  it('says which column is still missing or chosen twice', () => {
    expect(preview(CLEAN, { columns: { sigma: null } }).blocked).toBe('Choose the column of σ.');
    expect(preview(CLEAN, { columns: { sigma: 1 } }).blocked).toBe(
      'Column 2 is chosen twice; σ needs a column of its own.',
    );
  });

  it('is blocked by bad rows and free again once their lines are left out', () => {
    const before = preview(BROKEN);
    expect(before.sent).toBeNull();
    expect(before.blocked).toBe('2 lines need mending or leaving out.');
    expect(before.reading?.problems.map(({ line }) => line)).toEqual([3, 4]);
    const after = preview(BROKEN, { skipLines: [3, 4] });
    expect(after.blocked).toBeNull();
    expect(after.sent?.skipLines).toEqual([3, 4]);
    expect(after.reading?.points.map(({ energyKeV }) => energyKeV)).toEqual([2, 8]);
  });

  it('turns amplitudes into fractions: F = A/A_max, σ_F = σ_A/A_max', () => {
    const amplitudes = { on: true, maximum: '0,25', sigma: '0.005' };
    const { reading, sent } = preview('2 0.125 0.002\n4 0.1 0.002\n', { amplitudes });
    // Definition of the diamagnetic fraction from amplitudes; the scale error stays apart.
    expect(reading?.points[0]?.value).toBeCloseTo(0.5, 12);
    expect(reading?.points[0]?.sigma).toBeCloseTo(0.008, 12);
    expect(reading?.asymmetryScaleError).toBeCloseTo(0.02, 12);
    expect(sent?.asymmetry).toEqual({ maximum: 0.25, sigma: 0.005 });
  });

  it('asks for the maximum asymmetry and takes blank for blank, never for zero', () => {
    expect(preview(CLEAN, { amplitudes: { on: true, maximum: '', sigma: '0' } }).blocked).toContain(
      'Write the maximum asymmetry',
    );
    expect(
      preview(CLEAN, { amplitudes: { on: true, maximum: '0.25', sigma: '' } }).blocked,
    ).toContain('Write σ of the maximum asymmetry');
    expect(
      preview(CLEAN, { amplitudes: { on: true, maximum: '0.25x', sigma: '0' } }).blocked,
    ).toContain('Write the maximum asymmetry');
  });

  it('never applies amplitudes to a rate', () => {
    expect(
      preview(CLEAN, { amplitudes: { on: true, maximum: '0.25', sigma: '0' } }, 'rate').sent
        ?.asymmetry,
    ).toBeNull();
  });

  it('converts eV when that is chosen', () => {
    expect(
      preview('2000 0.7 0.01\n4000 0.6 0.01\n', { energyUnit: 'eV' }).reading?.points.map(
        (point) => point.energyKeV,
      ),
    ).toEqual([2, 4]);
  });
});
