import { listFits } from '@/db/access/fit/list-fits';
import { readHome } from '@/db/access/home/read-home';
import { listIssuedProfiles } from '@/db/access/profile/list-issued-profiles';
import { listReviews } from '@/db/access/review/list-reviews';
import { listSamples } from '@/db/access/sample/list-samples';
import { listScans } from '@/db/access/scan/list-scans';
import { listStoppingSets } from '@/db/access/stopping-set/list-stopping-sets';
import { listAudit } from '@/db/access/team/list-audit';
import { readTeam } from '@/db/access/team/read-team';
import { beforeAll, describe, expect, it } from 'vitest';

import { verbFixture, type Fixture } from './fixture';

const LISTS = [
  readHome,
  readTeam,
  listAudit,
  listSamples,
  listScans,
  listStoppingSets,
  listFits,
  listReviews,
  listIssuedProfiles,
];

describe('what another team sees of ours', () => {
  let fixture: Fixture;
  beforeAll(async () => {
    fixture = await verbFixture();
  });

  it.each(LISTS)('%o: nothing', async (list) => {
    const { sampleId, scanId, stoppingSetId, draftId, submittedId, issuedProfileId } = fixture;
    const { teamId, userIds, invitedEmail } = fixture;
    const ours = [sampleId, scanId, stoppingSetId, draftId, submittedId, issuedProfileId];
    const secrets = [...ours, teamId, invitedEmail, ...Object.values(userIds)];
    const seen = async (who: 'owner' | 'outsider') =>
      JSON.stringify(await list(await fixture.trial(who), {}));
    // The same question by our owner finds some of it: this check can fail.
    const byOwner = await seen('owner');
    expect(secrets.some((secret) => byOwner.includes(secret))).toBe(true);
    const byOutsider = await seen('outsider');
    for (const secret of secrets) expect(byOutsider).not.toContain(secret);
  });

  it('does not widen a list by an id of ours in the query', async () => {
    const ctx = await fixture.trial('outsider');
    expect(await listScans(ctx, { sampleId: fixture.sampleId })).toEqual([]);
    expect(await listFits(ctx, { scanId: fixture.scanId })).toEqual([]);
    expect(await listFits(ctx, { sampleId: fixture.sampleId })).toEqual([]);
    expect(await listIssuedProfiles(ctx, { query: 'SL-' })).toEqual([]);
  });
});
