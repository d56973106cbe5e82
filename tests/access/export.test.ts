import { exportProfile } from '@/db/access/profile/export-profile';
import { readIssuedProfile } from '@/db/access/profile/read-issued-profile';
import { acceptFit } from '@/db/access/review/accept-fit';
import { submitFit } from '@/db/access/review/submit-fit';
import type { IssuedProfile } from '@/lib/schemas/profile';
import Papa from 'papaparse';
import { beforeAll, describe, expect, it } from 'vitest';

import { savedFit, testData } from '../support/data';
import { testDatabase } from '../support/database';
import { testTeam, type TestTeam } from '../support/people';

describe('exporting an issued profile', async () => {
  const database = await testDatabase();
  let team: TestTeam;
  let issued: IssuedProfile;

  beforeAll(async () => {
    team = await testTeam(database);
    const id = await savedFit(team.analyst, await testData(team.analyst));
    await submitFit(await team.analyst.context(), { id });
    const { issuedProfileId } = await acceptFit(await team.reviewer.context(), { id });
    issued = await readIssuedProfile(await team.modeller.context(), { id: issuedProfileId });
  });

  async function exported(query: object = {}) {
    const { csv } = await exportProfile(await team.modeller.context(), { id: issued.id, ...query });
    const head = csv.split('\r\n').filter((line) => line.startsWith('#'));
    const parsed = Papa.parse<Record<string, string>>(csv, { header: true, comments: '#' });
    return { head, rows: parsed.data.filter((row) => row.flag !== undefined) };
  }

  it('writes the frozen profile point by point, with what a reader must know in front', async () => {
    const { head, rows } = await exported();
    const { points } = issued.fit.carrierProfile;
    expect(rows).toHaveLength(points.length);
    points.forEach((point, index) => {
      expect(Number(rows[index]?.depth_nm)).toBeCloseTo(point.depthNm, 8);
      expect(Number(rows[index]?.['concentration_cm-3'])).toBeCloseTo(point.value, -6);
      expect(rows[index]?.flag).toBe(point.flag);
    });
    const text = head.join('\n');
    for (const words of [
      `issued profile: ${issued.number}`,
      issued.fit.hashes.inputs,
      'parameter edgeDepthNm',
      'check ',
      'never of doping',
      'does not replace process qualification',
      'grid: fit grid',
    ])
      expect(text).toContain(words);
  });

  it('writes an even grid with bands of its own that agree with the fit grid', async () => {
    const { rows } = await exported({ grid: 'uniform', stepNm: 0.5 });
    expect(rows.slice(0, 3).map((row) => Number(row.depth_nm))).toEqual([0, 0.5, 1]);
    const end = issued.fit.carrierProfile.points.at(-1)?.depthNm ?? 0;
    expect(rows).toHaveLength(Math.floor(end / 0.5) + 1);
    // The same resamples on another grid: where depths coincide, every number does.
    const surface = issued.fit.carrierProfile.points[0];
    expect(Number(rows[0]?.['upper95_cm-3'])).toBeCloseTo(surface?.upper95 ?? Number.NaN, -6);
    expect(new Set(rows.map((row) => row['upper95_cm-3'])).size).toBeGreaterThan(20);
  });

  it('converts both units', async () => {
    const [plain] = (await exported({ grid: 'uniform', stepNm: '100' })).rows.slice(1);
    const units = { depthUnit: 'um', concentrationUnit: 'm-3' };
    const [converted] = (await exported({ grid: 'uniform', stepNm: '100', ...units })).rows.slice(
      1,
    );
    // 100 nm = 0.1 µm; 1 cm⁻³ = 10⁶ m⁻³.
    expect(Number(converted?.depth_um)).toBe(0.1);
    const ratio = Number(converted?.['concentration_m-3']) / Number(plain?.['concentration_cm-3']);
    expect(ratio).toBeCloseTo(1e6, -1);
  });

  it('refuses a step that makes too many rows, and says how many', async () => {
    await expect(exported({ grid: 'uniform', stepNm: '0.01' })).rejects.toMatchObject({
      code: 'invalid',
      fields: { stepNm: expect.stringMatching(/at most 20000/) },
    });
    await expect(exported({ grid: 'uniform', stepNm: '0' })).rejects.toMatchObject({
      code: 'invalid',
    });
  });

  it('remembers who took it and how', async () => {
    await exported({ depthUnit: 'cm' });
    const page = await readIssuedProfile(await team.owner.context(), { id: issued.id });
    expect(page.exports[0]).toMatchObject({ person: 'The modeller', grid: 'fit grid; cm, cm-3' });
  });
});
