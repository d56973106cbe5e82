import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { parsePasted } from '@/lib/files/parse-pasted';
import { readScan } from '@/lib/files/scan-file';
import { guessScanColumns } from '@/lib/files/scan-columns';
import { profileCsv, type ProfileCsvInput } from '@/lib/files/write-profile-csv';
import { scanCsv } from '@/lib/files/write-scan-csv';
import type { CarrierProfile } from '@/lib/inversion/index';
import { tableOf } from '../support/fixture';

const PROFILE: CarrierProfile = {
  unit: 'cm⁻³',
  bands: 'bootstrap',
  points: [
    {
      depthNm: 0,
      value: 0,
      lower68: 0,
      upper68: 1e12,
      lower95: -1e11,
      upper95: 2e12,
      flag: 'below floor',
    },
    {
      depthNm: 78.4,
      value: 6.2e15,
      lower68: 6e15,
      upper68: 6.5e15,
      lower95: null,
      upper95: null,
      flag: 'supported',
    },
  ],
  reachNm: 212.3,
  floor: 4e13,
};
const INPUT: ProfileCsvInput = {
  head: [
    ['number', 'SL-2026-014'],
    ['note', 'first, =HYPERLINK("x")\nsecond;+1'],
  ],
  profile: PROFILE,
  depthUnit: 'nm',
  concentrationUnit: 'cm-3',
  grid: 'fit grid',
};

const dataOf = (csv: string) =>
  csv.split('\r\n').filter((line) => line !== '' && !line.startsWith('#'));

describe('a profile as CSV', () => {
  // RFC 4180, section 2: CR LF after every record, the header line, the same number of fields throughout.
  it('follows RFC 4180', () => {
    const csv = profileCsv(INPUT);
    expect(csv.endsWith('\r\n')).toBe(true);
    expect(csv.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
    const records = dataOf(csv).map((line) => line.split(','));
    expect(records[0]).toEqual([
      'depth_nm',
      'concentration_cm-3',
      'lower68_cm-3',
      'upper68_cm-3',
      'lower95_cm-3',
      'upper95_cm-3',
      'flag',
    ]);
    expect(records.every((record) => record.length === 7)).toBe(true);
    expect(records[2]).toEqual([
      '78.4',
      '6200000000000000',
      '6000000000000000',
      '6500000000000000',
      '',
      '',
      'supported',
    ]);
  });

  it('begins with the head as comments and says what the value is not', () => {
    const lines = profileCsv(INPUT).split('\r\n');
    expect(lines[0]).toBe('# number: SL-2026-014');
    const head = lines.filter((line) => line.startsWith('# ')).join('\n');
    expect(head).toContain('never of doping; inside a depletion layer the two differ');
    expect(head).toContain('it does not replace process qualification');
    expect(head).toContain('# reach: 212.3 nm;');
  });

  it('converts units without binary noise', () => {
    const inCm = dataOf(profileCsv({ ...INPUT, depthUnit: 'cm', concentrationUnit: 'm-3' }));
    expect(inCm[0]).toContain('depth_cm,concentration_m-3,lower68_m-3');
    expect(inCm[2]).toBe('0.00000784,6.2e+21,6e+21,6.5e+21,,,supported');
    expect(dataOf(profileCsv({ ...INPUT, depthUnit: 'um' }))[2]).toMatch(/^0\.0784,/);
  });

  it('gives a populated share no unit and no conversion', () => {
    const share = {
      ...PROFILE,
      unit: 'populated share' as const,
      points: [
        {
          depthNm: 5,
          value: 0.25,
          lower68: 0.2,
          upper68: 0.3,
          lower95: 0.1,
          upper95: 0.4,
          flag: 'supported' as const,
        },
      ],
    };
    const lines = dataOf(profileCsv({ ...INPUT, profile: share, concentrationUnit: 'm-3' }));
    expect(lines[0]).toBe('depth_nm,populated_share,lower68,upper68,lower95,upper95,flag');
    expect(lines[1]).toBe('5,0.25,0.2,0.3,0.1,0.4,supported');
  });

  it.each([',', ';', '\t'])('begins no cell with a formula when opened at "%s"', (delimiter) => {
    const cells = Papa.parse<string[]>(profileCsv(INPUT), {
      delimiter,
      quoteChar: '"',
    }).data.flat();
    const formulas = cells.filter(
      (cell) => /^\s*[=+\-@]/.test(cell) && !/^-?[\d.e+]+$/.test(cell) && delimiter === ',',
    );
    const inHead = cells.filter((cell) => /^\s*[=+@]/.test(cell));
    expect([...formulas, ...inHead]).toEqual([]);
  });
});

describe('a scan as CSV', () => {
  it('is read back as it was', () => {
    const points = [
      { energyKeV: 2, value: 0.1 + 0.2, sigma: 0.01, enabled: true, note: 'run 1, "dark"' },
      { energyKeV: 4.5, value: -0.004, sigma: 0.02, enabled: false, note: '=1+1' },
    ];
    const csv = scanCsv({ head: [['sample', 'NB-31']], observable: 'fraction', points });
    const table = tableOf(csv);
    const columns = guessScanColumns(table);
    const reading =
      columns && readScan(table, columns, { observable: 'fraction', energyUnit: 'keV' });
    expect(reading?.problems).toEqual([]);
    expect(
      reading?.points.map(({ energyKeV, value, sigma, note }) => [energyKeV, value, sigma, note]),
    ).toEqual([
      [2, 0.3, 0.01, 'run 1, "dark"'],
      [4.5, -0.004, 0.02, 'switched off: =1+1'],
    ]);
    expect(csv).toContain('energy_keV,diamagnetic_fraction,sigma,note\r\n');
    const alone = scanCsv({
      head: [],
      observable: 'rate',
      points: [{ ...points[0], energyKeV: 1, value: 1, sigma: 1, enabled: true, note: '=1+1' }],
    });
    expect(alone).toContain("\r\n1,1,1,'=1+1\r\n");
  });
});

describe('a paste', () => {
  it('from a spreadsheet keeps empty cells and words', () => {
    expect(parsePasted('2\t0,7\t\r\n4\tbad\t0,1\r\n')).toEqual([
      ['2', '0,7', ''],
      ['4', 'bad', '0,1'],
    ]);
  });

  it('from a text finds the delimiter', () => {
    expect(parsePasted('2 0.7 0.1\n\n4 0.6 0.1')).toEqual([
      ['2', '0.7', '0.1'],
      ['4', '0.6', '0.1'],
    ]);
    expect(parsePasted('2;0,7;0,1')).toEqual([['2', '0,7', '0,1']]);
  });
});
