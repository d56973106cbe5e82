import { exportProfile } from '@/db/access/profile/export-profile';
import { listIssuedProfiles } from '@/db/access/profile/list-issued-profiles';
import { readIssuedProfile } from '@/db/access/profile/read-issued-profile';
import { readFit } from '@/db/access/fit/read-fit';
import { readHome } from '@/db/access/home/read-home';
import { acceptFit } from '@/db/access/review/accept-fit';
import { listReviews } from '@/db/access/review/list-reviews';
import { submitFit } from '@/db/access/review/submit-fit';
import { listAudit } from '@/db/access/team/list-audit';
import { beforeAll, describe, expect, it } from 'vitest';

import { savedFit, testData, type TestData } from '../support/data';
import { testDatabase } from '../support/database';
import { testTeam, type TestTeam } from '../support/people';

describe('the whole way from files to an exported profile', async () => {
  const database = await testDatabase();
  let team: TestTeam;
  let data: TestData;
  let fitId: string;

  beforeAll(async () => {
    team = await testTeam(database);
    data = await testData(team.analyst);
    fitId = await savedFit(team.analyst, data);
  });

  it('keeps the fit with its inputs, bands, checks and hashes', async () => {
    const fit = await readFit(await team.modeller.context(), { id: fitId });
    expect(fit.state).toBe('draft');
    expect(fit.answer.status).toBe('converged');
    expect(fit.carrierProfile.bands).toBe('bootstrap');
    expect(fit.checks.length).toBeGreaterThan(0);
    expect(fit.hashes.inputs).toMatch(/^[0-9a-f]{64}$/);
    expect(fit.may).toMatchObject({ submit: false, accept: false, comment: true });
  });

  it('goes through review to a number and a file', async () => {
    await submitFit(await team.analyst.context(), { id: fitId, note: 'Please look at 12 keV.' });
    expect(await listReviews(await team.reviewer.context(), {})).toHaveLength(1);
    const home = await readHome(await team.reviewer.context(), {});
    expect(home.waiting.map(({ id }) => id)).toEqual([fitId]);

    const issued = await acceptFit(await team.reviewer.context(), { id: fitId, note: '' });
    expect(issued.number).toBe(`SL-${new Date().getUTCFullYear()}-001`);
    const [row] = await listIssuedProfiles(await team.modeller.context(), { query: 'wafer sl-' });
    expect(row?.number).toBe(issued.number);

    const query = { id: issued.issuedProfileId, grid: 'uniform', stepNm: '2' };
    const { csv } = await exportProfile(await team.modeller.context(), query);
    expect(csv).toContain(`# issued profile: ${issued.number}\r\n`);
    expect(csv).toContain('depth_nm,concentration_cm-3,lower68_cm-3');
    const page = await readIssuedProfile(await team.owner.context(), {
      id: issued.issuedProfileId,
    });
    expect(page.exports).toHaveLength(1);
    expect(page.fit.events.map(({ kind }) => kind)).toEqual(['submitted', 'accepted']);

    const audit = await listAudit(await team.owner.context(), {});
    expect(audit.slice(0, 3).map(({ verb }) => verb)).toEqual([
      'export-profile',
      'accept-fit',
      'submit-fit',
    ]);
  });
});
