import type { Context } from '@/db/access/context';
import { compareFits } from '@/db/access/fit/compare-fits';
import { discardFit } from '@/db/access/fit/discard-fit';
import { listFits } from '@/db/access/fit/list-fits';
import { readFit } from '@/db/access/fit/read-fit';
import { saveFit } from '@/db/access/fit/save-fit';
import { readFile } from '@/db/access/file/read-file';
import { readHome } from '@/db/access/home/read-home';
import { acceptInvitation } from '@/db/access/person/accept-invitation';
import { listSessions } from '@/db/access/person/list-sessions';
import { readInvitation } from '@/db/access/person/read-invitation';
import { revokeSession } from '@/db/access/person/revoke-session';
import { signIn } from '@/db/access/person/sign-in';
import { signOut } from '@/db/access/person/sign-out';
import { signUp } from '@/db/access/person/sign-up';
import { exportProfile } from '@/db/access/profile/export-profile';
import { listIssuedProfiles } from '@/db/access/profile/list-issued-profiles';
import { readIssuedProfile } from '@/db/access/profile/read-issued-profile';
import { acceptFit } from '@/db/access/review/accept-fit';
import { commentFit } from '@/db/access/review/comment-fit';
import { listReviews } from '@/db/access/review/list-reviews';
import { returnFit } from '@/db/access/review/return-fit';
import { submitFit } from '@/db/access/review/submit-fit';
import { archiveSample } from '@/db/access/sample/archive-sample';
import { createSample } from '@/db/access/sample/create-sample';
import { editSample } from '@/db/access/sample/edit-sample';
import { listSamples } from '@/db/access/sample/list-samples';
import { readSample } from '@/db/access/sample/read-sample';
import { restoreSample } from '@/db/access/sample/restore-sample';
import { archiveScan } from '@/db/access/scan/archive-scan';
import { createScan } from '@/db/access/scan/create-scan';
import { editScan } from '@/db/access/scan/edit-scan';
import { listScans } from '@/db/access/scan/list-scans';
import { readScan } from '@/db/access/scan/read-scan';
import { restoreScan } from '@/db/access/scan/restore-scan';
import { archiveStoppingSet } from '@/db/access/stopping-set/archive-stopping-set';
import { createStoppingSet } from '@/db/access/stopping-set/create-stopping-set';
import { editStoppingSet } from '@/db/access/stopping-set/edit-stopping-set';
import { listStoppingSets } from '@/db/access/stopping-set/list-stopping-sets';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';
import { restoreStoppingSet } from '@/db/access/stopping-set/restore-stopping-set';
import { cancelInvitation } from '@/db/access/team/cancel-invitation';
import { changeRole } from '@/db/access/team/change-role';
import { invitePerson } from '@/db/access/team/invite-person';
import { listAudit } from '@/db/access/team/list-audit';
import { readTeam } from '@/db/access/team/read-team';
import { removePerson } from '@/db/access/team/remove-person';
import { switchTeam } from '@/db/access/team/switch-team';
import { AppError, type ErrorCode } from '@/lib/errors';
import { beforeAll, describe, expect, it } from 'vitest';

import { SAMPLE, scanInput, SCAN_META, stoppingInput, STOPPING_META } from '../support/data';
import { PASSWORD } from '../support/people';
import { PEOPLE, verbFixture, type Fixture, type Who } from './fixture';
import { functionsOfContext, verbNames } from './verb-files';

/** `yes`: carried out. `nothing`: carried out, and nothing of this team is in the answer. */
type Outcome = 'yes' | 'nothing' | ErrorCode;
type Outcomes = readonly [Outcome, Outcome, Outcome, Outcome, Outcome, Outcome];

interface Row {
  verb: (ctx: Context, input: unknown) => Promise<unknown>;
  input: (fixture: Fixture, ctx: Context) => unknown;
  /** In the order of PEOPLE: signed out, outsider, owner, analyst, reviewer, modeller. */
  outcomes: Outcomes;
}

const out = 'unauthenticated';
const no = 'forbidden';
const gone = 'not_found';
const ANYONE: Outcomes = ['yes', 'yes', 'yes', 'yes', 'yes', 'yes'];
const SIGNED_IN: Outcomes = [out, 'yes', 'yes', 'yes', 'yes', 'yes'];
const LISTS: Outcomes = [out, 'nothing', 'yes', 'yes', 'yes', 'yes'];
const READS: Outcomes = [out, gone, 'yes', 'yes', 'yes', 'yes'];
const CREATES: Outcomes = [out, 'yes', 'yes', 'yes', no, no];
const EDITS: Outcomes = [out, gone, 'yes', 'yes', no, no];
const DECIDES: Outcomes = [out, gone, 'yes', no, 'yes', no];
const MANAGES: Outcomes = [out, gone, 'yes', no, no, no];

const newPerson = { name: 'New', email: 'new@example.org', password: PASSWORD, teamName: 'New' };
const nothing = () => ({});

const ROWS: Row[] = [
  { verb: signUp, input: () => newPerson, outcomes: ANYONE },
  {
    verb: signIn,
    input: () => ({ email: 'nobody@example.org', password: PASSWORD }),
    // Whoever asks: an address that nobody has signs nobody in.
    outcomes: [out, out, out, out, out, out],
  },
  { verb: readInvitation, input: (f) => ({ token: f.invitationToken }), outcomes: ANYONE },
  {
    verb: acceptInvitation,
    input: (f) => ({ token: f.invitationToken, name: 'Invited', password: PASSWORD }),
    outcomes: ANYONE,
  },
  { verb: signOut, input: nothing, outcomes: SIGNED_IN },
  { verb: listSessions, input: nothing, outcomes: SIGNED_IN },
  {
    verb: revokeSession,
    input: (_, ctx) => ({ id: ctx.sessionId ?? 'none' }),
    outcomes: SIGNED_IN,
  },

  { verb: readTeam, input: nothing, outcomes: SIGNED_IN },
  { verb: switchTeam, input: (f) => ({ teamId: f.teamId }), outcomes: READS },
  {
    verb: invitePerson,
    input: () => ({ email: 'second@example.org', role: 'reviewer' }),
    outcomes: [out, 'yes', 'yes', no, no, no],
  },
  { verb: cancelInvitation, input: (f) => ({ id: f.invitationId }), outcomes: MANAGES },
  {
    verb: changeRole,
    input: (f) => ({ userId: f.userIds.modeller, role: 'reviewer' }),
    outcomes: MANAGES,
  },
  { verb: removePerson, input: (f) => ({ userId: f.userIds.modeller }), outcomes: MANAGES },
  { verb: listAudit, input: nothing, outcomes: [out, 'yes', 'yes', no, no, no] },

  { verb: createSample, input: () => SAMPLE, outcomes: CREATES },
  { verb: listSamples, input: nothing, outcomes: LISTS },
  { verb: readSample, input: (f) => ({ id: f.sampleId }), outcomes: READS },
  { verb: editSample, input: (f) => ({ id: f.sampleId, ...SAMPLE }), outcomes: EDITS },
  { verb: archiveSample, input: (f) => ({ id: f.sampleId }), outcomes: EDITS },
  { verb: restoreSample, input: (f) => ({ id: f.sampleId }), outcomes: EDITS },

  { verb: createScan, input: (f) => scanInput(f.sampleId), outcomes: EDITS },
  { verb: listScans, input: nothing, outcomes: LISTS },
  { verb: readScan, input: (f) => ({ id: f.scanId }), outcomes: READS },
  {
    verb: editScan,
    input: (f) => ({ id: f.scanId, meta: SCAN_META, points: null }),
    outcomes: EDITS,
  },
  { verb: archiveScan, input: (f) => ({ id: f.scanId }), outcomes: EDITS },
  { verb: restoreScan, input: (f) => ({ id: f.scanId }), outcomes: EDITS },

  { verb: createStoppingSet, input: stoppingInput, outcomes: CREATES },
  { verb: listStoppingSets, input: nothing, outcomes: LISTS },
  { verb: readStoppingSet, input: (f) => ({ id: f.stoppingSetId }), outcomes: READS },
  {
    verb: editStoppingSet,
    input: (f) => ({ id: f.stoppingSetId, meta: STOPPING_META }),
    outcomes: EDITS,
  },
  { verb: archiveStoppingSet, input: (f) => ({ id: f.stoppingSetId }), outcomes: EDITS },
  { verb: restoreStoppingSet, input: (f) => ({ id: f.stoppingSetId }), outcomes: EDITS },
  { verb: readFile, input: (f) => ({ id: f.fileId }), outcomes: READS },

  { verb: saveFit, input: (f) => f.claim, outcomes: EDITS },
  { verb: listFits, input: nothing, outcomes: LISTS },
  { verb: readFit, input: (f) => ({ id: f.draftId }), outcomes: READS },
  { verb: compareFits, input: (f) => ({ ids: [f.draftId, f.submittedId] }), outcomes: READS },
  {
    verb: discardFit,
    input: (f) => ({ id: f.draftId }),
    // Only the analyst made it; an owner does not discard another's work.
    outcomes: [out, gone, no, 'yes', no, no],
  },

  { verb: submitFit, input: (f) => ({ id: f.draftId, note: '' }), outcomes: EDITS },
  { verb: acceptFit, input: (f) => ({ id: f.submittedId, note: '' }), outcomes: DECIDES },
  { verb: returnFit, input: (f) => ({ id: f.submittedId, reason: 'Why?' }), outcomes: DECIDES },
  {
    verb: commentFit,
    input: (f) => ({ id: f.submittedId, body: 'Look.', target: 'point 12 keV' }),
    outcomes: READS,
  },
  { verb: listReviews, input: nothing, outcomes: LISTS },

  { verb: listIssuedProfiles, input: nothing, outcomes: LISTS },
  { verb: readIssuedProfile, input: (f) => ({ id: f.issuedProfileId }), outcomes: READS },
  { verb: exportProfile, input: (f) => ({ id: f.issuedProfileId }), outcomes: READS },
  { verb: readHome, input: nothing, outcomes: SIGNED_IN },
];

describe('every verb against every role', () => {
  let fixture: Fixture;
  beforeAll(async () => {
    fixture = await verbFixture();
  });

  it('lists all verbs that there are', () => {
    expect(ROWS.map(({ verb }) => verb.name).sort()).toEqual(verbNames());
  });

  it('has every verb in a file of its own name', () => {
    expect(functionsOfContext()).toEqual(verbNames());
  });

  const cells = ROWS.flatMap((row) =>
    PEOPLE.map((who, index) => ({
      ...row,
      name: row.verb.name,
      who,
      expected: row.outcomes[index],
    })),
  );
  it.each(cells)('$name by $who: $expected', async ({ verb, input, who, expected }) => {
    expect(await outcomeOf(verb, input, who)).toBe(expected);
  });

  async function outcomeOf(verb: Row['verb'], input: Row['input'], who: Who): Promise<Outcome> {
    const ctx = await fixture.trial(who);
    try {
      const answer = await verb(ctx, input(fixture, ctx));
      return Array.isArray(answer) && answer.length === 0 ? 'nothing' : 'yes';
    } catch (error) {
      if (error instanceof AppError) return error.code;
      throw error;
    }
  }
});
