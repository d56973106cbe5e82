import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';
import { acceptFit } from '@/db/access/review/accept-fit';
import { submitFit } from '@/db/access/review/submit-fit';
import { invitePerson } from '@/db/access/team/invite-person';
import { readTeam } from '@/db/access/team/read-team';
import { openDatabase } from '@/db/client';
import type { SaveFitInput } from '@/lib/schemas/fit';
import type { Context } from '@/db/access/context';
import { sql } from 'drizzle-orm';
import { copyFileSync } from 'node:fs';
import { onTestFinished } from 'vitest';

import { honestFit, savedFit, testData, type TestData } from '../support/data';
import { contextOn, filePath, testDatabase } from '../support/database';
import { personWithTeam, testTeam } from '../support/people';

export const PEOPLE = [
  'signedOut',
  'outsider',
  'owner',
  'analyst',
  'reviewer',
  'modeller',
] as const;
export type Who = (typeof PEOPLE)[number];

/** A team with something in every state, to try each verb on. */
export interface Fixture extends TestData {
  fileId: string;
  draftId: string;
  submittedId: string;
  issuedProfileId: string;
  invitationId: string;
  invitationToken: string;
  invitedEmail: string;
  userIds: Record<'owner' | 'analyst' | 'reviewer' | 'modeller', string>;
  teamId: string;
  claim: SaveFitInput;
  /** A context of this person on a fresh copy of the database: no trial sees what another one did. */
  trial: (who: Who) => Promise<Context>;
}

const FEW = { resamples: 10 };

export async function verbFixture(): Promise<Fixture> {
  const database = await testDatabase();
  const team = await testTeam(database);
  const outsider = await personWithTeam(database, 'Outsider');
  const data = await testData(team.analyst);
  const draftId = await savedFit(team.analyst, data, FEW);
  const submittedId = await savedFit(team.analyst, data, FEW);
  const acceptedId = await savedFit(team.analyst, data, FEW);
  for (const id of [submittedId, acceptedId])
    await submitFit(await team.analyst.context(), { id, note: '' });
  const { issuedProfileId } = await acceptFit(await team.reviewer.context(), {
    id: acceptedId,
    note: '',
  });
  const invitedEmail = 'invited@example.org';
  const invited = { email: invitedEmail, role: 'analyst' };
  const { path } = await invitePerson(await team.owner.context(), invited);
  const { id: teamId, people, invitations } = await readTeam(await team.owner.context(), {});
  const set = await readStoppingSet(await team.owner.context(), { id: data.stoppingSetId });
  const claim = await honestFit(team.analyst, data, FEW);
  await database.db.run(sql`pragma wal_checkpoint(truncate)`);

  const userIdOf = (role: string) => people.find((person) => person.role === role)?.userId ?? '';
  const tokens = { signedOut: undefined, outsider: outsider.sessionToken };
  let copies = 0;
  return {
    ...data,
    fileId: set.files[0]?.id ?? '',
    draftId,
    submittedId,
    issuedProfileId,
    invitationId: invitations[0]?.id ?? '',
    invitationToken: path.split('/').at(-1) ?? '',
    invitedEmail,
    userIds: {
      owner: userIdOf('owner'),
      analyst: userIdOf('analyst'),
      reviewer: userIdOf('reviewer'),
      modeller: userIdOf('modeller'),
    },
    teamId,
    claim,
    trial: async (who) => {
      const copy = `${filePath(database)}.copy-${(copies += 1)}`;
      copyFileSync(filePath(database), copy);
      const opened = await openDatabase(`file:${copy}`);
      onTestFinished(opened.close);
      const token =
        who === 'signedOut' || who === 'outsider' ? tokens[who] : team[who].sessionToken;
      return contextOn(opened, token);
    },
  };
}
