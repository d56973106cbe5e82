import { describe, expect, it } from 'vitest';
import {
  guessEnergyUnit,
  guessScanColumns,
  readScan,
  type ScanReadOptions,
} from '@/lib/files/scan-file';
import type { Table } from '@/lib/files/table';
import { MAX_BINS, MAX_ENERGIES } from '@/lib/inversion/index';
import { fixtureTable, tableOf } from '../support/fixture';

const FRACTION: ScanReadOptions = { observable: 'fraction', energyUnit: 'keV' };

function read(table: Table, options: Partial<ScanReadOptions> = {}) {
  const columns = guessScanColumns(table);
  if (!columns) throw new Error('no columns');
  return readScan(table, columns, {
    ...FRACTION,
    energyUnit: guessEnergyUnit(table, columns.energy),
    ...options,
  });
}

const bare = (table: Table, options?: Partial<ScanReadOptions>) =>
  read(table, options).points.map(({ energyKeV, value, sigma }) => ({ energyKeV, value, sigma }));

describe('one scan in many dresses', () => {
  const expected = bare(fixtureTable('files/scan.csv'));

  it('has the points that the file shows', () => {
    expect(expected).toHaveLength(13);
    expect(expected[0]).toEqual({ energyKeV: 2, value: 0.7451, sigma: 0.0045 });
    expect(expected[12]).toEqual({ energyKeV: 22, value: 0.4428, sigma: 0.0045 });
  });

  it.each([
    'scan-no-header.txt',
    'scan-decimal-comma.csv',
    'scan-blanks.txt',
    'scan-blanks-decimal-comma.txt',
    'scan-tabs.tsv',
    'scan-bom.csv',
    'scan-windows.csv',
    'scan-comments.txt',
    'scan-trailing-delimiter.csv',
    'scan-quoted.csv',
    'scan-electronvolts.csv',
  ])('%s gives the same points without a problem', (name) => {
    const table = fixtureTable(`files/${name}`);
    expect(read(table).problems).toEqual([]);
    expect(bare(table)).toEqual(expected);
  });

  it('amplitudes become fractions, with the error of the largest asymmetry apart', () => {
    const reading = read(fixtureTable('files/scan-amplitudes.csv'), {
      asymmetry: { maximum: 0.25, sigma: 0.002 },
    });
    expect(reading.problems).toEqual([]);
    expect(reading.asymmetryScaleError).toBeCloseTo(0.008, 12);
    // The file gives six decimals: 5e-7 over 0.25 is the most that they can be off.
    reading.points.forEach(({ value, sigma }, index) => {
      expect(Math.abs(value - (expected[index]?.value ?? Number.NaN))).toBeLessThan(2.1e-6);
      expect(Math.abs(sigma - (expected[index]?.sigma ?? Number.NaN))).toBeLessThan(2.1e-6);
    });
  });

  it('keeps line, run note and counts', () => {
    const quoted = read(fixtureTable('files/scan-quoted.csv')).points[1];
    expect(quoted).toMatchObject({ line: 3, note: 'run 2, "dark"', enabled: true });
    const counted = read(fixtureTable('files/scan-electronvolts.csv')).points[0];
    expect(counted).toMatchObject({ counts: 2_000_000, note: 'R11' });
  });
});

describe('columns', () => {
  it.each([
    ['error,E (keV),F', { energy: 1, value: 2, sigma: 0 }],
    ['capture_rate_per_us,sigma_per_us,energy_keV', { energy: 2, value: 0, sigma: 1 }],
    ['Energie,Anteil,Fehler', { energy: 0, value: 1, sigma: 2 }],
    [
      'implantation energy,diamagnetic fraction,error of the fraction',
      { energy: 0, value: 1, sigma: 2 },
    ],
    ['x,y,dy', { energy: 0, value: 1, sigma: 2 }],
  ])('%s', (header, columns) => {
    expect(guessScanColumns(tableOf(`${header}\n1,2,3\n`))).toMatchObject(columns);
  });

  it('takes the first three columns of numbers without a header, and words for a note', () => {
    expect(guessScanColumns(tableOf('dark 2 0.7 0.1\ndark 4 0.6 0.1\n'))).toEqual({
      energy: 1,
      value: 2,
      sigma: 3,
      counts: null,
      note: 0,
    });
  });

  it('gives up with two columns', () => {
    expect(guessScanColumns(fixtureTable('bad/two-columns.csv'))).toBeNull();
  });

  it('knows eV by the heading or by the size of the numbers', () => {
    expect(guessEnergyUnit(tableOf('E (eV),f,s\n20,1,1\n'), 0)).toBe('eV');
    expect(guessEnergyUnit(tableOf('E_keV,f,s\n2000,1,1\n'), 0)).toBe('keV');
    expect(guessEnergyUnit(tableOf('2000 0.5 0.1\n'), 0)).toBe('eV');
    expect(guessEnergyUnit(tableOf('20 0.5 0.1\n'), 0)).toBe('keV');
  });
});

describe('what is refused, by line and column', () => {
  it.each([
    [
      'nan.csv',
      'nan.csv, line 4, column 2: expected a finite number for the fraction, found "NaN".',
    ],
    [
      'text-in-number.csv',
      'text-in-number.csv, line 4, column 2: expected a number for the fraction, found "0.7x2".',
    ],
    [
      'negative-sigma.csv',
      'negative-sigma.csv, line 4, column 3: expected σ greater than 0, found -0.005.',
    ],
    ['zero-sigma.csv', 'zero-sigma.csv, line 4, column 3: expected σ greater than 0, found 0.'],
    [
      'missing-cell.csv',
      'missing-cell.csv, line 4, column 3: expected a number for σ, found an empty cell.',
    ],
    [
      'energy-zero.csv',
      'energy-zero.csv, line 4, column 1: expected an energy above 0 keV, found 0.',
    ],
    [
      'duplicate-energy.csv',
      'duplicate-energy.csv, line 4, column 1: expected each energy once, found 4 keV again; it already stands on line 3.',
    ],
    [
      'not-a-fraction.csv',
      'not-a-fraction.csv, line 4, column 2: expected a fraction between 0 and 1 within 5 σ, found 1.702 ± 0.005.',
    ],
    [
      'decimal-comma-among-points.csv',
      'decimal-comma-among-points.csv, line 4, column 2: expected a number for the fraction, found "0,702" (this file is read with a decimal point; the cell has a decimal comma).',
    ],
    [
      'first-row-bad.csv',
      'first-row-bad.csv, line 1, column 1: expected a number for the energy, found "abc".',
    ],
    [
      'too-many-energies.csv',
      'too-many-energies.csv, line 202: expected at most 200 energies, found 201 lines of data.',
    ],
  ])('%s', (name, message) => {
    expect(read(fixtureTable(`bad/${name}`)).problems.map((problem) => problem.message)).toEqual([
      message,
    ]);
  });

  it('names every fault and not only the first, and keeps the good rows', () => {
    const reading = read(tableOf('energy,f,sigma\n2,x,-1\n4,0.6,0.1\n6,nan,0\n'));
    expect(reading.problems.map(({ line, column }) => [line, column])).toEqual([
      [2, 2],
      [2, 3],
      [4, 2],
      [4, 3],
    ]);
    expect(reading.points.map(({ energyKeV }) => energyKeV)).toEqual([4]);
  });

  it('leaves out the lines that were switched off', () => {
    const reading = read(fixtureTable('bad/nan.csv'), { skipLines: [4] });
    expect(reading.problems).toEqual([]);
    expect(reading.points.map(({ line }) => line)).toEqual([2, 3, 5, 6, 7]);
  });

  it('lets a value lie outside its range by noise', () => {
    const scan = 'energy,f,sigma\n2,1.02,0.005\n4,-0.02,0.005\n6,1.0251,0.005\n';
    expect(read(tableOf(scan)).problems.map(({ line }) => line)).toEqual([4]);
    const rates = 'energy,rate,sigma\n2,55,1\n4,-4,1\n6,-6,1\n';
    expect(read(tableOf(rates), { observable: 'rate' }).problems.map(({ line }) => line)).toEqual([
      4,
    ]);
  });

  it('needs a point and a usable largest asymmetry', () => {
    expect(
      read(fixtureTable('bad/two-points.csv'), { skipLines: [2, 3] }).problems.map(
        ({ message }) => message,
      ),
    ).toEqual(['two-points.csv, line 2: expected at least one line with energy, value and σ.']);
    const reading = read(fixtureTable('files/scan-amplitudes.csv'), {
      asymmetry: { maximum: 0, sigma: 0.1 },
    });
    expect(reading.problems.at(-1)?.message).toContain('expected a largest asymmetry above 0');
  });

  it('looks at no more rows of a file that is no scan than it takes to say so', () => {
    const { points, problems } = read(tableOf('1 2 3\n'.repeat(MAX_BINS)));
    expect(points.length + problems.length).toBeLessThan(12 * MAX_ENERGIES);
    expect(problems.at(-1)?.message).toContain(`found ${MAX_BINS} lines of data`);
  });
});
