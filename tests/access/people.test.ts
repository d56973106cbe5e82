import { listSamples } from '@/db/access/sample/list-samples';
import { acceptInvitation } from '@/db/access/person/accept-invitation';
import { listSessions } from '@/db/access/person/list-sessions';
import { readInvitation } from '@/db/access/person/read-invitation';
import { revokeSession } from '@/db/access/person/revoke-session';
import { signIn } from '@/db/access/person/sign-in';
import { signOut } from '@/db/access/person/sign-out';
import { signUp } from '@/db/access/person/sign-up';
import { readSession } from '@/db/access/session';
import { cancelInvitation } from '@/db/access/team/cancel-invitation';
import { changeRole } from '@/db/access/team/change-role';
import { invitePerson } from '@/db/access/team/invite-person';
import { readTeam } from '@/db/access/team/read-team';
import { removePerson } from '@/db/access/team/remove-person';
import { switchTeam } from '@/db/access/team/switch-team';
import { sessions } from '@/db/schema/sessions';
import { users } from '@/db/schema/users';
import { eq } from 'drizzle-orm';
import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';

import { testDatabase } from '../support/database';
import { memberOf, PASSWORD, personWithTeam, testTeam } from '../support/people';

const DAY_MS = 24 * 60 * 60 * 1000;

describe('people', async () => {
  const database = await testDatabase();
  const signInAs = async (email: string, password = PASSWORD) =>
    signIn(await database.context(), { email, password });

  it('stores argon2id and never the password', async () => {
    const { email } = await personWithTeam(database);
    const [person] = await database.db.select().from(users).where(eq(users.email, email));
    expect(person?.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(JSON.stringify(person)).not.toContain(PASSWORD);
  });

  it('finds an address however it is written, once', async () => {
    const { email } = await personWithTeam(database);
    await signInAs(`  ${email.toUpperCase()} `);
    const again = { name: 'Twin', email: email.toUpperCase(), password: PASSWORD, teamName: 'Two' };
    await expect(signUp(await database.context(), again)).rejects.toMatchObject({
      code: 'conflict',
      fields: { email: expect.any(String) },
    });
  });

  it('refuses a wrong password and an unknown address in the same words', async () => {
    const { email } = await personWithTeam(database);
    const refusals = await Promise.all(
      [signInAs(email, 'not it'), signInAs('nobody@example.org', 'not it')].map((attempt) =>
        attempt.catch((error: Error) => error.message),
      ),
    );
    expect(refusals[0]).toBe(refusals[1]);
    expect(refusals[0]).toMatch(/do not go together/);
  });

  it('slows guessing down from one client, and lets the person in from another', async () => {
    const { email } = await personWithTeam(database);
    const ctx = await database.context();
    for (let attempt = 0; attempt < 8; attempt += 1)
      await expect(signIn(ctx, { email, password: 'a guess' })).rejects.toMatchObject({
        code: 'unauthenticated',
      });
    await expect(signIn(ctx, { email, password: PASSWORD })).rejects.toMatchObject({
      code: 'too_many',
      message: expect.stringMatching(/Try again in 15 minutes/),
    });
    await signInAs(email);
  });

  it('keeps only the hash of a session token', async () => {
    const { sessionToken } = await personWithTeam(database);
    const rows = await database.db.select().from(sessions);
    expect(JSON.stringify(rows)).not.toContain(sessionToken);
    const hash = createHash('sha256').update(sessionToken).digest('hex');
    expect(rows.map(({ id }) => id)).toContain(hash);
    // Who has a copy of the table holds the hash, and the hash is no token.
    expect(await readSession(database.db, hash)).toBeNull();
  });

  it('lists sessions, ends one from another device, and never those of others', async () => {
    const person = await personWithTeam(database);
    const other = await personWithTeam(database, 'Other');
    const phone = await signInAs(person.email);
    const rows = await listSessions(await person.context(), {});
    expect(rows.map(({ current }) => current).sort()).toEqual([false, true]);
    const theirs = await listSessions(await other.context(), {});
    await expect(
      revokeSession(await person.context(), { id: theirs[0]?.id }),
    ).rejects.toMatchObject({ code: 'not_found' });

    const phoneRow = rows.find(({ current }) => !current);
    await revokeSession(await person.context(), { id: phoneRow?.id });
    expect(await readSession(database.db, phone.sessionToken)).toBeNull();
    await signOut(await person.context(), {});
    expect(await readSession(database.db, person.sessionToken)).toBeNull();
  });

  it('forgets a session that has run out', async () => {
    const { sessionToken } = await personWithTeam(database);
    const id = createHash('sha256').update(sessionToken).digest('hex');
    const past = Math.floor(Date.now() / 1000) - 1;
    await database.db.update(sessions).set({ expiresAt: past }).where(eq(sessions.id, id));
    expect(await readSession(database.db, sessionToken)).toBeNull();
    expect(await database.db.$count(sessions, eq(sessions.id, id))).toBe(0);
  });

  it('replaces the session of a browser that signs in again', async () => {
    const person = await personWithTeam(database);
    const again = await signIn(await person.context(), { email: person.email, password: PASSWORD });
    expect(await readSession(database.db, person.sessionToken)).toBeNull();
    expect(await readSession(database.db, again.sessionToken)).not.toBeNull();
  });
});

describe('teams', async () => {
  const database = await testDatabase();

  async function invite(
    owner: { context: () => ReturnType<typeof database.context> },
    email: string,
  ) {
    const { path } = await invitePerson(await owner.context(), { email, role: 'analyst' });
    return path.split('/').at(-1) ?? '';
  }
  const accept = async (token: string, password = PASSWORD) =>
    acceptInvitation(await database.context(), { token, name: 'Guest', password });

  it('opens an invitation once, for seven days, until it is cancelled or replaced', async () => {
    const owner = await personWithTeam(database);
    const used = await invite(owner, 'used@example.org');
    await accept(used);
    const gone = { code: 'not_found' };
    await expect(accept(used)).rejects.toMatchObject(gone);

    const late = await invite(owner, 'late@example.org');
    const ctx = await database.context();
    const inAWeek = { ...ctx, now: new Date(Date.now() + 7 * DAY_MS + 1000) };
    await expect(readInvitation(inAWeek, { token: late })).rejects.toMatchObject(gone);
    const replaced = await invite(owner, 'late@example.org');
    await expect(readInvitation(ctx, { token: late })).rejects.toMatchObject(gone);
    expect(await readInvitation(ctx, { token: replaced })).toMatchObject({ known: false });
    const { invitations } = await readTeam(await owner.context(), {});
    expect(invitations).toHaveLength(1);
    await cancelInvitation(await owner.context(), { id: invitations[0]?.id });
    await expect(accept(replaced)).rejects.toMatchObject(gone);
  });

  it('lets two people with one link in once', async () => {
    const owner = await personWithTeam(database);
    const token = await invite(owner, 'race@example.org');
    const both = await Promise.allSettled([accept(token), accept(token)]);
    expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  });

  it('asks a known person for the password, and never changes it', async () => {
    const guest = await personWithTeam(database, 'Guest');
    const owner = await personWithTeam(database);
    const token = await invite(owner, guest.email);
    expect(await readInvitation(await database.context(), { token })).toMatchObject({
      known: true,
    });
    await expect(accept(token, 'another long password')).rejects.toMatchObject({
      code: 'unauthenticated',
    });
    const { sessionToken } = await accept(token);
    const { viewer } = await database.context(sessionToken);
    expect(viewer?.teams).toHaveLength(2);
    expect(viewer?.teamName).toBe('Team of Owner');
    await signIn(await database.context(), { email: guest.email, password: PASSWORD });
  });

  it('works in one team at a time, with the role of that team', async () => {
    const guest = await personWithTeam(database, 'Guest');
    const owner = await personWithTeam(database);
    const token = await invite(owner, guest.email);
    const { sessionToken } = await accept(token);
    const before = await database.context(sessionToken);
    expect(before.viewer?.role).toBe('analyst');
    const home = before.viewer?.teams.find(({ role }) => role === 'owner');
    await switchTeam(before, { teamId: home?.id });
    const after = await database.context(sessionToken);
    expect(after.viewer).toMatchObject({ role: 'owner', teamId: home?.id });
    await expect(switchTeam(after, { teamId: crypto.randomUUID() })).rejects.toMatchObject({
      code: 'not_found',
    });
  });

  it('never loses its last owner', async () => {
    const team = await testTeam(database);
    const { people } = await readTeam(await team.owner.context(), {});
    const owner = people.find(({ role }) => role === 'owner')?.userId;
    const analyst = people.find(({ role }) => role === 'analyst')?.userId;
    for (const attempt of [
      changeRole(await team.owner.context(), { userId: owner, role: 'analyst' }),
      removePerson(await team.owner.context(), { userId: owner }),
    ])
      await expect(attempt).rejects.toMatchObject({ code: 'conflict' });
    await changeRole(await team.owner.context(), { userId: analyst, role: 'owner' });
    await removePerson(await team.analyst.context(), { userId: owner });
    expect((await team.owner.context()).viewer).toBeNull();
  });

  it('takes effect at once: a new role with the next request, a removed person is signed out', async () => {
    const owner = await personWithTeam(database);
    const member = await memberOf(database, owner, 'modeller');
    const { people } = await readTeam(await owner.context(), {});
    const userId = people.find(({ role }) => role === 'modeller')?.userId;
    await changeRole(await owner.context(), { userId, role: 'reviewer' });
    expect((await member.context()).viewer?.role).toBe('reviewer');
    await removePerson(await owner.context(), { userId });
    await expect(listSamples(await member.context(), {})).rejects.toMatchObject({
      code: 'unauthenticated',
    });
    await expect(
      signIn(await database.context(), { email: member.email, password: PASSWORD }),
    ).rejects.toMatchObject({ code: 'forbidden' });
  });

  it('shows open invitations to owners only', async () => {
    const team = await testTeam(database);
    await invite(team.owner, 'open@example.org');
    expect((await readTeam(await team.owner.context(), {})).invitations).toHaveLength(1);
    expect((await readTeam(await team.analyst.context(), {})).invitations).toHaveLength(0);
  });
});
