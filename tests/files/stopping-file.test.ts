import { describe, expect, it } from 'vitest';
import { energyInText } from '@/lib/files/energy-in-text';
import {
  guessStoppingLayout,
  readStoppingFiles,
  type StoppingReadOptions,
} from '@/lib/files/stopping-file';
import type { Table } from '@/lib/files/table';
import { MAX_BINS, stoppingMoments, type StoppingSet } from '@/lib/inversion/index';
import { fixtureTable, tableOf } from '../support/fixture';

/** Read as the files say of themselves. */
function read(tables: Table[], options: Partial<StoppingReadOptions> = {}) {
  const { depthUnit, positionsAre, weightsAre, implantedPerEnergy } = guessStoppingLayout(tables);
  return readStoppingFiles(tables, {
    depthUnit,
    positionsAre,
    weightsAre,
    implantedPerEnergy,
    ...options,
  });
}

function setOf(tables: Table[], options?: Partial<StoppingReadOptions>): StoppingSet {
  const { set, problems } = read(tables, options);
  if (!set) throw new Error(problems.map(({ message }) => message).join('\n'));
  return set;
}

const matrix = () => setOf([fixtureTable('files/stopping.csv')]);

describe('a stopping matrix in many dresses', () => {
  it('has an energy per column, masses that sum to one, and the share that was lost', () => {
    const { profiles } = matrix();
    expect(profiles.map(({ energyKeV }) => energyKeV)).toEqual([
      2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22,
    ]);
    for (const { mass, edgesNm, lostShare } of profiles) {
      expect(mass.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
      expect([edgesNm.length, edgesNm[0], edgesNm[320]]).toEqual([321, 0, 320]);
      expect(lostShare).toBeGreaterThan(0);
      expect(lostShare).toBeLessThan(0.02);
    }
  });

  // The invented profiles follow the rule of thumb for germanium: common practice, no source.
  it.each([
    [6, 40, 50],
    [14, 80, 90],
  ])('at %d keV muons stop between %d and %d nm on average', (energyKeV, least, most) => {
    const profile = matrix().profiles.find((one) => one.energyKeV === energyKeV);
    const mean = profile ? stoppingMoments(profile).meanNm : Number.NaN;
    expect(mean).toBeGreaterThan(least);
    expect(mean).toBeLessThan(most);
  });

  it.each([
    'stopping-angstrom-electronvolts.txt',
    'stopping-bare-energies.csv',
    'stopping-edges-density.tsv',
  ])('%s gives the same profiles', (name) => {
    const { profiles } = setOf([fixtureTable(`files/${name}`)]);
    matrix().profiles.forEach((expected, index) => {
      const found = profiles[index];
      expect(found?.energyKeV).toBeCloseTo(expected.energyKeV, 12);
      expected.mass.forEach((share, bin) => expect(found?.mass[bin]).toBeCloseTo(share, 12));
      expected.edgesNm.forEach((edge, bin) => expect(found?.edgesNm[bin]).toBeCloseTo(edge, 9));
    });
  });

  it('says what it guessed', () => {
    const layout = (name: string) => guessStoppingLayout([fixtureTable(`files/${name}`)]);
    expect(layout('stopping.csv')).toMatchObject({
      layout: 'matrix',
      depthUnit: 'nm',
      positionsAre: 'centres',
      weightsAre: 'counts',
      implantedPerEnergy: 100_000,
    });
    expect(layout('stopping-angstrom-electronvolts.txt')).toMatchObject({ depthUnit: 'A' });
    expect(layout('stopping-edges-density.tsv')).toMatchObject({
      positionsAre: 'edges',
      weightsAre: 'density',
    });
    expect(layout('single/14keV.txt')).toMatchObject({ layout: 'per-energy', energiesKeV: [14] });
  });
});

describe('one file per energy', () => {
  const singles = () =>
    ['6.5keV.txt', '14keV.txt', '2keV.txt', '22keV.txt', 'E_10000eV.dat'].map((name) =>
      fixtureTable(`files/single/${name}`),
    );

  it('reads the energy from the name, and sorts', () => {
    const { profiles } = setOf(singles());
    expect(profiles.map(({ energyKeV }) => energyKeV)).toEqual([2, 6.5, 10, 14, 22]);
    expect(profiles[3]?.mass).toEqual(matrix().profiles[8]?.mass);
  });

  it('takes a typed energy over the name', () => {
    const { profiles } = setOf(singles(), { energiesKeV: [7, null, null, null, null] });
    expect(profiles.map(({ energyKeV }) => energyKeV)).toEqual([2, 7, 10, 14, 22]);
  });

  it('may stand beside a matrix, with typed energies by file', () => {
    const tables = [fixtureTable('files/stopping.csv'), tableOf('1 5\n2 9\n3 4\n', 'more.txt')];
    expect(setOf(tables, { energiesKeV: [null, 9] }).profiles).toHaveLength(14);
  });

  it('leaves a column of errors alone when the name gives the energy', () => {
    const { profiles } = setOf([tableOf('1 5 0.2\n2 9 0.3\n', '12.5keV.txt')]);
    expect(profiles.map(({ energyKeV }) => energyKeV)).toEqual([12.5]);
  });

  it.each([
    ['12.5keV.txt', 12.5],
    ['E_4000eV.dat', 4],
    ['ge-12p5keV.csv', 12.5],
    ['12,5 keV', 12.5],
    ['run 3 at 8_keV', 8],
    ['profile-7.txt', null],
    ['12 kevlar', null],
  ])('%s names %s keV', (text, energy) => {
    expect(energyInText(text)).toBe(energy);
  });
});

describe('what is refused, by file, line and column', () => {
  it.each([
    [
      'stopping-out-of-order.csv',
      'line 4, column 1: expected depths in ascending order, found 2 after 3.',
    ],
    ['stopping-negative.csv', 'line 4, column 2: expected counts of 0 or more, found -30.'],
    ['stopping-nan.csv', 'line 4, column 3: expected a finite number for the counts, found "nan".'],
    ['stopping-text.csv', 'line 4, column 1: expected a number for the depth, found "five".'],
    [
      'stopping-missing-cell.csv',
      'line 4, column 3: expected a number for the counts, found an empty cell.',
    ],
    [
      'stopping-duplicate-energy.csv',
      'line 1, column 3: expected each energy once, found 2 keV again; column 2 has it already.',
    ],
    [
      'stopping-no-energy.csv',
      'line 1, column 3: expected a heading with an energy (such as “12.5 keV”), found "counts".',
    ],
    [
      'stopping-no-header.txt',
      'line 1: expected a header with the energy of each column (such as “2 keV”); a matrix without one does not say its energies.',
    ],
    [
      'stopping-zero-column.csv',
      'line 2, column 3: expected some counts at 12 keV, found zero on every line.',
    ],
  ])('%s', (name, sentence) => {
    const { set, problems } = read([fixtureTable(`bad/${name}`)]);
    expect(set).toBeNull();
    expect(problems.map(({ message }) => message)).toEqual([`${name}, ${sentence}`]);
  });

  it('a file that names no energy, until one is typed', () => {
    const table = fixtureTable('bad/stopping-unnamed.txt');
    expect(read([table]).problems.map(({ message }) => message)).toEqual([
      'stopping-unnamed.txt: expected the energy in the file name (such as 12.5keV.txt) or in a heading; type it in.',
    ]);
    expect(setOf([table], { energiesKeV: [3] }).profiles[0]?.energyKeV).toBe(3);
  });

  it('a matrix without header, until its energies are typed', () => {
    const table = fixtureTable('bad/stopping-no-header.txt');
    expect(
      setOf([table], { energiesKeV: [2, 12] }).profiles.map(({ energyKeV }) => energyKeV),
    ).toEqual([2, 12]);
  });

  it('two files of one energy', () => {
    const tables = ['a-4keV.txt', 'b-4000eV.txt'].map((name) => tableOf('1 5\n2 9\n', name));
    expect(read(tables).problems.map(({ message }) => message)).toEqual([
      'b-4000eV.txt: expected each energy once, found 4 keV again; a-4keV.txt has it already.',
    ]);
  });

  it('more counts than muons', () => {
    const problems = read([tableOf('# implanted: 10\n1 5\n2 9\n', '4keV.txt')]).problems;
    expect(problems.map(({ message }) => message)).toEqual([
      '4keV.txt: expected no more counts than the 10 muons implanted, found 14 at 4 keV.',
    ]);
  });

  it('one column, one line, too many energies and too many bins', () => {
    const reasons = (text: string) =>
      read([tableOf(text, '4keV.txt')]).problems.map(({ message }) => message);
    expect(reasons('1\n2\n')[0]).toContain(
      'line 1: expected a depth column and at least one column of counts',
    );
    expect(reasons('1 2\n')[0]).toContain(
      'line 1: expected at least two lines of depth and counts',
    );
    const wide = [
      'depth_nm',
      ...Array.from({ length: 201 }, (_, index) => `${index + 1} keV`),
    ].join(',');
    const row = (depth: number) => [depth, ...Array.from({ length: 201 }, () => 1)].join(',');
    expect(reasons([wide, row(1), row(2)].join('\n'))[0]).toContain(
      'line 1, column 202: expected at most 200 energies, found 201.',
    );
    const deep = Array.from({ length: MAX_BINS + 1 }, (_, index) => `${index} 1`).join('\n');
    expect(reasons(deep)[0]).toContain(
      `line ${MAX_BINS + 1}: expected at most ${MAX_BINS} depth bins`,
    );
    expect(reasons(deep.slice(0, deep.lastIndexOf('\n')))).toEqual([]);
  });

  it('names a thousand faults and no more', () => {
    const { problems } = read([tableOf('bad -1\n'.repeat(700), '4keV.txt')]);
    expect(problems).toHaveLength(1001);
    expect(problems[1000]?.message).toBe(
      '4keV.txt, line 501: more than 1000 faults; the rest of the file was not looked at.',
    );
  });

  it('lines that were switched off are left out', () => {
    const table = fixtureTable('bad/stopping-nan.csv');
    const { profiles } = setOf([table], { skipLines: { 'stopping-nan.csv': [4] } });
    expect(profiles[0]?.mass).toHaveLength(4);
  });
});

describe('what is said without being refused', () => {
  it('a last bin that no line closes', () => {
    const { set, warnings } = read([tableOf('lower_edge_nm,4 keV,6 keV\n0,5,2\n2,3,4\n4,0,0\n')]);
    expect([...(set?.profiles[0]?.edgesNm ?? [])]).toEqual([0, 2, 4, 6]);
    expect(warnings).toEqual([
      'typed.csv: no line closes the last bin; it is taken to be as wide as the one before it (2 nm).',
    ]);
  });

  it('depths that end before the muons do', () => {
    const { warnings } = read([tableOf('1 5\n2 9\n3 2\n', '4keV.txt')]);
    expect(warnings).toEqual([
      '4keV.txt: at 4 keV muons still stop in the last bin; the depths may end too early.',
    ]);
  });
});
