import { describe, expect, it } from 'vitest';
import { readTable } from '@/lib/files/read-table';
import { MAX_BINS, MAX_FILE_BYTES } from '@/lib/inversion/index';
import { fixtureBytes, fixtureTable, tableOf } from '../support/fixture';

describe('how a file is delimited', () => {
  it.each([
    ['scan.csv', 'comma', 'point'],
    ['scan-no-header.txt', 'blanks', 'point'],
    ['scan-decimal-comma.csv', 'semicolon', 'comma'],
    ['scan-blanks.txt', 'blanks', 'point'],
    ['scan-blanks-decimal-comma.txt', 'blanks', 'comma'],
    ['scan-tabs.tsv', 'tab', 'point'],
    ['scan-bom.csv', 'comma', 'point'],
    ['scan-windows.csv', 'comma', 'point'],
    ['scan-comments.txt', 'blanks', 'point'],
    ['scan-trailing-delimiter.csv', 'comma', 'point'],
    ['scan-quoted.csv', 'comma', 'point'],
    ['stopping.csv', 'comma', 'point'],
    ['stopping-bare-energies.csv', 'semicolon', 'comma'],
    ['stopping-edges-density.tsv', 'tab', 'point'],
  ])('%s: %s, decimal %s', (name, delimiter, decimal) => {
    expect(fixtureTable(`files/${name}`)).toMatchObject({ delimiter, decimal });
  });

  it('lets the guess be overruled', () => {
    const table = tableOf('1;2\n3;4\n', 'a.csv', { delimiter: 'comma' });
    expect(table.columnCount).toBe(1);
    const given = { delimiter: 'semicolon', decimal: 'point' } as const;
    expect(tableOf('1,5;2,5\n', 'a.csv', given)).toMatchObject(given);
  });

  it('tells whole numbers between commas from decimal commas', () => {
    expect(tableOf('1,5\n2,9\n3,12\n')).toMatchObject({ delimiter: 'comma', columnCount: 2 });
    expect(tableOf('1,5 3,25\n2,5 9,75\n')).toMatchObject({
      delimiter: 'blanks',
      decimal: 'comma',
    });
    expect(tableOf('1 , 5\n2 , 9\n')).toMatchObject({ delimiter: 'comma', columnCount: 2 });
  });
});

describe('lines and headers', () => {
  it('keeps the line of the original file through comments and blank lines', () => {
    const table = tableOf('# made up\n\nenergy,f,s\n2,0.7,0.1\n\n% pause\n4,0.6,0.1\n');
    expect(table).toMatchObject({ header: ['energy', 'f', 's'], headerLine: 3 });
    expect(table.rows.map(({ line }) => line)).toEqual([4, 7]);
    expect(table.comments).toEqual([
      { line: 1, text: 'made up' },
      { line: 6, text: 'pause' },
    ]);
  });

  it('counts the lines inside a quoted cell', () => {
    const table = tableOf('2,0.7,0.1,"first\nrun"\n4,0.6,0.1,second\n');
    expect(table.rows.map(({ line }) => line)).toEqual([1, 3]);
    expect(table.rows[0]?.cells[3]).toBe('first\nrun');
  });

  it('takes a header from the last comment before the data when it fits the columns', () => {
    const table = fixtureTable('files/scan-comments.txt');
    expect(table).toMatchObject({ header: ['energy_keV', 'fraction', 'sigma'], headerLine: 4 });
    expect(table.comments.at(-2)).toEqual({ line: 8, text: 'beam was low' });
    expect(tableOf('# sample seven dark\n2 0.7 0.1\n').header).toBeNull();
  });

  it('does not take a faulty first row for a header', () => {
    const table = fixtureTable('bad/first-row-bad.csv');
    expect(table.header).toBeNull();
    expect(table.rows[0]).toEqual({ line: 1, cells: ['abc', '0.74', '0.005'] });
    expect(tableOf('NaN NaN NaN\n1 2 3\n').rows).toHaveLength(2);
  });

  it('takes a depth heading with bare energies for a header', () => {
    expect(fixtureTable('files/stopping-bare-energies.csv').header?.slice(0, 3)).toEqual([
      'Tiefe_nm',
      '2',
      '3',
    ]);
  });

  it('leaves out a column that is blank throughout, at the end of the lines only', () => {
    expect(fixtureTable('files/scan-trailing-delimiter.csv').columnCount).toBe(3);
    expect(tableOf('1,,3\n4,,6\n').columnCount).toBe(3);
  });

  it('reads a row with an empty first cell between semicolons as a row', () => {
    const table = tableOf('2;0,7;0,1\n;0,6;0,1\n; a comment\n');
    expect(table.rows.map(({ cells }) => cells)).toEqual([
      ['2', '0,7', '0,1'],
      ['', '0,6', '0,1'],
    ]);
    expect(table.comments).toEqual([{ line: 3, text: 'a comment' }]);
  });

  it('reads old line ends and the end mark of DOS', () => {
    expect(tableOf('1 2\r3 4\r\u001a').rows.map(({ line }) => line)).toEqual([1, 2]);
  });
});

describe('what is refused', () => {
  it.each([
    ['empty.csv', 'empty.csv: the file is empty.'],
    ['blank.csv', 'blank.csv: the file holds no text, only blanks.'],
    [
      'comments-only.csv',
      'comments-only.csv: the file holds comments only; expected lines of numbers.',
    ],
    ['picture.csv', 'picture.csv: the file is binary, not text; expected a table of numbers.'],
    [
      'workbook.csv',
      'workbook.csv: the file is a workbook or an archive, not text; export the sheet as CSV.',
    ],
    [
      'utf16.csv',
      'utf16.csv: the file is UTF-16 text; save it as UTF-8 (in a spreadsheet: “CSV UTF-8”).',
    ],
    [
      'latin1.csv',
      'latin1.csv, line 3: the line holds characters that are not UTF-8 text; save the file as UTF-8.',
    ],
    [
      'open-quote.csv',
      'open-quote.csv, line 4: a cell opens with a double quote that is not closed properly.',
    ],
  ])('%s', (name, message) => {
    const read = readTable(name, fixtureBytes(`bad/${name}`));
    expect(read.ok ? [] : read.problems.map((problem) => problem.message)).toEqual([message]);
  });

  const reasons = (bytes: Uint8Array) => {
    const read = readTable('large.csv', bytes);
    return read.ok ? [] : read.problems.map(({ message }) => message);
  };

  it('a file over the limit, and none at it', () => {
    // Comments, so that nothing but the size can be in the way.
    const comment = new TextEncoder().encode('#'.padEnd(1023) + '\n');
    const bytes = new Uint8Array(6 * 1024 * 1024).map((_, index) => comment[index % 1024] ?? 0);
    bytes.set(new TextEncoder().encode('1 2 3\n'));
    expect(reasons(bytes)).toEqual(['large.csv: the file has 6 MB; the limit is 5 MB.']);
    expect(reasons(bytes.subarray(0, MAX_FILE_BYTES))).toEqual([]);
    expect(reasons(bytes.subarray(0, MAX_FILE_BYTES + 1))[0]).toContain('the file has 5.01 MB');
  });

  it('a table longer or wider than any that is used, before it is split', () => {
    const encode = (text: string) => new TextEncoder().encode(text);
    const longest = '1 2 3\n'.repeat(MAX_BINS + 2);
    expect(reasons(encode(longest))).toEqual([]);
    expect(reasons(encode(`${longest}1 2 3\n`))).toEqual([
      'large.csv: expected at most 20000 lines of numbers, found 20003.',
    ]);
    expect(reasons(encode(`1,2\n${'1,'.repeat(10_001)}\n`))).toEqual([
      'large.csv, line 2: expected at most 20000 characters on a line, found 20002.',
    ]);
  });
});
