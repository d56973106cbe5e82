import { readFile } from '@/db/access/file/read-file';
import { createScan } from '@/db/access/scan/create-scan';
import { listScans } from '@/db/access/scan/list-scans';
import { readScan } from '@/db/access/scan/read-scan';
import { createStoppingSet } from '@/db/access/stopping-set/create-stopping-set';
import { listStoppingSets } from '@/db/access/stopping-set/list-stopping-sets';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';
import { files } from '@/db/schema/files';
import { MAX_FILE_BYTES } from '@/lib/inversion/index';
import { createHash } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';

import {
  bytesOf,
  scanInput,
  SCAN_META,
  SCAN_READING,
  stoppingInput,
  STOPPING_META,
  STOPPING_READING,
  testData,
  type TestData,
} from '../support/data';
import { testDatabase } from '../support/database';
import { personWithTeam, type TestPerson } from '../support/people';

describe('files in', async () => {
  const database = await testDatabase();
  let analyst: TestPerson;
  let data: TestData;

  beforeAll(async () => {
    analyst = await personWithTeam(database);
    data = await testData(analyst);
  });

  const scanOf = (name: string, bytes: Uint8Array, reading: object = SCAN_READING) => ({
    sampleId: data.sampleId,
    meta: SCAN_META,
    source: { kind: 'file', name, bytes, reading },
  });

  it('keeps the original byte for byte, with the hash that anyone can check', async () => {
    const { source } = scanInput(data.sampleId);
    const scan = await readScan(await analyst.context(), { id: data.scanId });
    const kept = await readFile(await analyst.context(), { id: scan.file?.id });
    expect(Buffer.from(kept.bytes)).toEqual(Buffer.from(source.bytes));
    expect(kept.sha256).toBe(createHash('sha256').update(source.bytes).digest('hex'));
    expect(scan.file).toMatchObject({ sha256: kept.sha256, byteLength: source.bytes.byteLength });
  });

  it('keeps stopping profiles to the last bit, with mass 1 in each', async () => {
    const set = await readStoppingSet(await analyst.context(), { id: data.stoppingSetId });
    expect(set.energiesKeV).toEqual([2, 4, 6, 8, 10, 12, 14, 18, 22]);
    for (const { mass, edgesNm, lostShare } of set.profiles) {
      expect(edgesNm).toHaveLength(mass.length + 1);
      expect(mass.reduce((sum, one) => sum + one, 0)).toBeCloseTo(1, 12);
      expect(lostShare).toBeGreaterThan(0);
    }
    const again = await createStoppingSet(await analyst.context(), stoppingInput());
    const { sha256 } = await readStoppingSet(await analyst.context(), again);
    expect(sha256).toBe(set.sha256);
  });

  const head = 'energy_keV,fraction,sigma\n';
  const bad: [string, string | Uint8Array, RegExp][] = [
    ['text in a number', `${head}2,0.7,0.01\n4,abc,0.01\n`, /bad\.csv, line 3, column 2: .*abc/],
    ['NaN', `${head}2,NaN,0.01\n`, /bad\.csv, line 2, column 2/],
    ['σ of zero', `${head}2,0.7,0\n`, /bad\.csv, line 2, column 3/],
    ['negative σ', `${head}2,0.7,-0.01\n`, /bad\.csv, line 2, column 3/],
    ['one energy twice', `${head}2,0.7,0.01\n2,0.7,0.01\n`, /bad\.csv, line 3, column 1/],
    ['a binary file', Uint8Array.from([0x50, 0x4b, 3, 4, 0, 0, 0, 1, 2]), /bad\.csv/],
    ['an empty file', '', /bad\.csv/],
    ['6 MB', new Uint8Array(6 * 1024 * 1024).fill(0x31), /bad\.csv.*5 MB/],
  ];

  it.each(bad)('refuses a scan with %s by place and stores nothing', async (_, content, words) => {
    const before = await rows();
    const bytes = typeof content === 'string' ? bytesOf(content) : content;
    const reading = { ...SCAN_READING, columns: { ...SCAN_READING.columns, note: null } };
    await expect(
      createScan(await analyst.context(), scanOf('bad.csv', bytes, reading)),
    ).rejects.toMatchObject({ code: 'invalid', message: expect.stringMatching(words) });
    expect(await rows()).toEqual(before);
  });

  it('names every bad row, and takes the file once they are switched off by name', async () => {
    const text = `${head}2,0.70,0.01\n4,x,0.01\n6,0.6,0.01\n8,0.5,-1\n`;
    const reading = { ...SCAN_READING, columns: { ...SCAN_READING.columns, note: null } };
    await expect(
      createScan(await analyst.context(), scanOf('two.csv', bytesOf(text), reading)),
    ).rejects.toMatchObject({
      fields: {
        'two.csv, line 3, column 2': expect.any(String),
        'two.csv, line 5, column 3': expect.any(String),
      },
    });
    const skipping = { ...reading, skipLines: [3, 5] };
    const input = scanOf('two.csv', bytesOf(text), skipping);
    const { id } = await createScan(await analyst.context(), input);
    const scan = await readScan(await analyst.context(), { id });
    expect(scan.points.map(({ energyKeV }) => energyKeV)).toEqual([2, 6]);
  });

  it('turns amplitudes into fractions and keeps the scale error apart', async () => {
    const text = 'energy,amplitude,sigma\n2,0.2,0.01\n4,0.1,0.01\n';
    const reading = {
      ...SCAN_READING,
      columns: { ...SCAN_READING.columns, note: null },
      asymmetry: { maximum: 0.25, sigma: 0.005 },
    };
    const input = scanOf('amplitudes.csv', bytesOf(text), reading);
    const { id } = await createScan(await analyst.context(), input);
    const scan = await readScan(await analyst.context(), { id });
    // F = A/A_max = 0.2/0.25 and σ_F = 0.01/0.25, by hand.
    expect(scan.points[0]).toMatchObject({ value: 0.8, sigma: 0.04 });
    expect(scan.asymmetryScaleError).toBeCloseTo(0.02, 12);
  });

  it('refuses typed points as it refuses the same points in a file', async () => {
    const point = { energyKeV: 2, value: 0.7, sigma: 0.01, enabled: true, note: '' };
    const typed = async (points: object[]) =>
      createScan(await analyst.context(), {
        sampleId: data.sampleId,
        meta: SCAN_META,
        source: { kind: 'typed', points },
      });
    await expect(typed([point, point])).rejects.toThrow(/Row 2: .*once/);
    await expect(typed([{ ...point, value: 1.2 }])).rejects.toThrow(/Row 1: .*between 0 and 1/);
    await expect(typed([{ ...point, sigma: 0 }])).rejects.toMatchObject({ code: 'invalid' });
    await expect(typed([{ ...point, value: Number.NaN }])).rejects.toMatchObject({
      code: 'invalid',
    });
    await typed([point, { ...point, energyKeV: 4 }]);
  });

  const badSets: [string, string, RegExp][] = [
    ['depths out of order', 'depth,2 keV\n1,5\n3,6\n2,7\n', /set\.csv, line 4/],
    ['a negative weight', 'depth,2 keV\n1,5\n2,-6\n3,7\n', /set\.csv, line 3, column 2/],
    ['text', 'depth,2 keV\n1,5\n2,many\n3,7\n', /set\.csv, line 3, column 2/],
    ['one energy twice', 'depth,2 keV,2 keV\n1,5,5\n2,6,6\n', /once/],
    ['no energies', '1,5,5\n2,6,6\n3,7,7\n', /energy of each column/],
    ['an empty column', 'depth,2 keV\n1,0\n2,0\n3,0\n', /set\.csv/],
  ];

  it.each(badSets)('refuses a stopping set with %s and stores nothing', async (_, text, words) => {
    const before = await rows();
    const reading = { ...STOPPING_READING, implantedPerEnergy: null };
    const input = {
      meta: STOPPING_META,
      reading,
      files: [{ name: 'set.csv', bytes: bytesOf(text) }],
    };
    await expect(createStoppingSet(await analyst.context(), input)).rejects.toMatchObject({
      code: 'invalid',
      message: expect.stringMatching(words),
    });
    expect(await rows()).toEqual(before);
  });

  it('takes one file per energy, in whatever order, and refuses two of one name', async () => {
    const one = { delimiter: 'tab', decimal: 'point', energyKeV: null, skipLines: [] };
    const text = (peak: number) => `1\t${peak}\n3\t9\n5\t2\n`;
    const sent = [
      { name: '8keV.txt', bytes: bytesOf(text(4)) },
      { name: '4keV.txt', bytes: bytesOf(text(7)) },
    ];
    const reading = { ...STOPPING_READING, implantedPerEnergy: null, files: [one, one] };
    const input = { meta: STOPPING_META, reading, files: sent };
    const created = await createStoppingSet(await analyst.context(), input);
    const set = await readStoppingSet(await analyst.context(), created);
    expect(set.energiesKeV).toEqual([4, 8]);
    expect(set.files.map(({ name }) => name)).toEqual(['8keV.txt', '4keV.txt']);
    const twins = { ...input, files: [sent[0], { ...sent[1], name: '8keV.txt' }] };
    await expect(createStoppingSet(await analyst.context(), twins)).rejects.toThrow(/once/);
  });

  it('has the limit of the product', () => {
    expect(MAX_FILE_BYTES).toBe(5 * 1024 * 1024);
  });

  async function rows() {
    const ctx = await analyst.context();
    return {
      files: await database.db.$count(files),
      scans: (await listScans(ctx, {})).length,
      sets: (await listStoppingSets(ctx, {})).length,
    };
  }
});
