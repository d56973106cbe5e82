import { describe, expect, it } from 'vitest';

import { leaveOutTest } from '@/components/stopping/may-leave-out';
import { previewStopping, type TableCache } from '@/components/stopping/preview-stopping';
import {
  NO_STOPPING_CHOICES,
  withFileChoices,
  withFiles,
  withLinesLeftOut,
  withoutFile,
  type StoppingChoices,
} from '@/components/stopping/stopping-choices';
import { fileFromText } from '@/components/upload/chosen-file';

const MATRIX = 'depth_nm,2 keV,8 keV\n5,40,10\n15,30,30\n25,10,40\n35,0,10\n';
const ONE = 'depth_nm counts\n5 40\n15 30\n25 10\n';

const of = (files: Record<string, string>, change: Partial<StoppingChoices> = {}) => ({
  ...withFiles(
    NO_STOPPING_CHOICES,
    Object.entries(files).map(([name, text]) => fileFromText(name, text)),
  ),
  ...change,
});
const preview = (choices: StoppingChoices) => previewStopping(choices, new WeakMap());

describe('preview of stopping profiles', () => {
  it('reads a matrix with the energies of its headings and is ready to send', () => {
    const { set, blocked, sent } = preview(of({ 'matrix.csv': MATRIX }));
    expect(set?.profiles.map(({ energyKeV }) => energyKeV)).toEqual([2, 8]);
    expect(blocked).toBeNull();
    expect(sent).toMatchObject({
      depthUnit: 'nm',
      weightsAre: 'counts',
      files: [{ delimiter: 'comma', energyKeV: null }],
    });
  });

  it('reads many one-energy files, the energy from the name or typed', () => {
    const choices = of({ '2keV.txt': ONE, 'run-b.txt': ONE });
    expect(preview(choices).blocked).toBe('One problem needs mending.');
    expect(preview(choices).problems[0]?.message).toContain('run-b.txt');
    const typed = withFileChoices(choices, 'run-b.txt', { energy: '12,5' });
    expect(preview(typed).set?.profiles.map(({ energyKeV }) => energyKeV)).toEqual([2, 12.5]);
    expect(preview(typed).sent?.files.map(({ energyKeV }) => energyKeV)).toEqual([null, 12.5]);
  });

  it('keeps a typed energy with its file when a matrix stands before it', () => {
    const choices = withFileChoices(of({ 'matrix.csv': MATRIX, 'late.txt': ONE }), 'late.txt', {
      energy: '20',
    });
    expect(preview(choices).set?.profiles.map(({ energyKeV }) => energyKeV)).toEqual([2, 8, 20]);
  });

  it('says that a typed energy or number of muons is none instead of dropping it', () => {
    const choices = withFileChoices(of({ '2keV.txt': ONE }), '2keV.txt', { energy: 'two' });
    expect(preview(choices).blocked).toBe('Energy of 2keV.txt: expected keV above 0.');
    expect(preview(of({ 'matrix.csv': MATRIX }, { implanted: '-5' })).blocked).toContain(
      'Implanted muons',
    );
  });

  it('scales depths by the unit that is chosen', () => {
    const last = (unit: 'nm' | 'A' | 'um') =>
      preview(of({ '2keV.txt': ONE }, { depthUnit: unit })).set?.profiles[0]?.edgesNm.at(-1) ?? 0;
    // 1 µm = 1000 nm, 1 Å = 0.1 nm (SI; the ångström is 1e-10 m).
    expect(last('um') / last('nm')).toBeCloseTo(1000, 9);
    expect(last('A') / last('nm')).toBeCloseTo(0.1, 12);
  });

  it('gives the share that did not stop when the implanted muons are known', () => {
    const { set } = preview(of({ 'matrix.csv': MATRIX }, { implanted: '100' }));
    expect(set?.profiles.map(({ lostShare }) => Number(lostShare?.toFixed(12)))).toEqual([
      0.2, 0.1,
    ]);
  });

  it('does not read a file again for a change of unit, and does for another delimiter', () => {
    const cache: TableCache = new WeakMap();
    const choices = of({ 'matrix.csv': MATRIX });
    const before = previewStopping(choices, cache).files[0]?.table;
    expect(previewStopping({ ...choices, depthUnit: 'um' }, cache).files[0]?.table).toBe(before);
    expect(
      previewStopping(withFileChoices(choices, 'matrix.csv', { delimiter: 'tab' }), cache).files[0]
        ?.table,
    ).not.toBe(before);
  });
});

describe('lines that are bad', () => {
  const BROKEN = 'depth_nm,2 keV,8 keV\n5,40,10\n15,-3,30\n25,10,x\n20,5,5\n35,1,1\n';

  it('are named by file, line and column, and can be left out', () => {
    const choices = of({ 'matrix.csv': BROKEN });
    const { problems, files, set } = preview(choices);
    expect(set).toBeNull();
    expect(problems.map(({ line, column }) => [line, column])).toEqual([
      [3, 2],
      [4, 3],
      [5, 1],
    ]);
    const mayLeaveOut = leaveOutTest(files.map(({ table }) => table));
    expect(problems.map(mayLeaveOut)).toEqual([true, true, true]);
    const after = preview(withLinesLeftOut(choices, problems));
    expect(after.blocked).toBeNull();
    expect(after.sent?.files[0]?.skipLines).toEqual([3, 4, 5]);
  });

  it('are not offered where leaving out would not mend: a column of zeros, a heading without energy', () => {
    const zeros = preview(of({ 'matrix.csv': 'depth_nm,2 keV,8 keV\n5,40,0\n15,3,0\n25,1,0\n' }));
    const heading = preview(
      of({ 'matrix.csv': 'depth_nm,2 keV,8 keV,error\n5,40,1,1\n15,3,1,1\n' }),
    );
    for (const { problems, files } of [zeros, heading]) {
      expect(problems).toHaveLength(1);
      expect(problems.map(leaveOutTest(files.map(({ table }) => table)))).toEqual([false]);
    }
  });
});

describe('the list of files', () => {
  it('takes a file of the same name in the place of the first, and forgets all choices with the last', () => {
    const choices = withFiles(of({ '2keV.txt': ONE }), [fileFromText('2keV.txt', MATRIX)]);
    expect(choices.entries).toHaveLength(1);
    expect(withoutFile({ ...choices, depthUnit: 'um' }, '2keV.txt')).toEqual(NO_STOPPING_CHOICES);
  });
});
