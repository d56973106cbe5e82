import { createSampleAction } from '@/app/(desk)/samples/actions';
import { revokeSessionAction } from '@/app/(desk)/account/actions';
import { invitePersonAction, switchTeamAction } from '@/app/(desk)/team/actions';
import {
  acceptInvitationAction,
  signInAction,
  signOutAction,
  signUpAction,
} from '@/app/(public)/actions';
import { formAction } from '@/app/_server/form-action';
import { read } from '@/app/_server/read';
import { PATH_HEADER } from '@/app/_server/path-header';
import { listSamples } from '@/db/access/sample/list-samples';
import { readSample } from '@/db/access/sample/read-sample';
import { readSession } from '@/db/access/session';
import { beforeAll, describe, expect, it, vi } from 'vitest';

import { testDatabase } from '../support/database';
import {
  arrive,
  cookiesSet,
  NotFound,
  Redirected,
  revalidated,
  serveFrom,
  SESSION_COOKIE,
} from '../support/next-request';
import { PASSWORD, personWithTeam, type TestPerson } from '../support/people';

vi.mock('next/headers', async () => (await import('../support/next-request')).nextHeaders);
vi.mock('next/cache', async () => (await import('../support/next-request')).nextCache);
vi.mock('next/navigation', async () => (await import('../support/next-request')).nextNavigation);

function formOf(fields: Record<string, string>): FormData {
  const data = new FormData();
  for (const [name, value] of Object.entries(fields)) data.set(name, value);
  return data;
}

const redirectOf = (attempt: Promise<unknown>) =>
  attempt.then(
    () => 'no redirect',
    (error: unknown) => {
      if (error instanceof Redirected) return error.to;
      throw error;
    },
  );

describe('server actions', async () => {
  const database = await testDatabase();
  let owner: TestPerson;
  beforeAll(async () => {
    serveFrom(database);
    owner = await personWithTeam(database);
  });

  const credentials = (next?: string) =>
    formOf({ email: owner.email, password: PASSWORD, ...(next === undefined ? {} : { next }) });

  it('sign in with a cookie that scripts cannot read, and go where one wanted to', async () => {
    arrive(undefined, { 'user-agent': 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Firefox/140.0' });
    expect(await redirectOf(signInAction(null, credentials('/samples?q=1')))).toBe('/samples?q=1');
    const [cookie] = cookiesSet();
    expect(cookie).toMatchObject({
      name: SESSION_COOKIE,
      options: { httpOnly: true, sameSite: 'lax', path: '/', secure: false },
    });
    const session = await readSession(database.db, cookie?.value ?? '');
    expect(session?.viewer.email).toBe(owner.email);
  });

  it('make the cookie Secure behind https', async () => {
    arrive(undefined, { 'x-forwarded-proto': 'https' });
    await redirectOf(signInAction(null, credentials()));
    expect(cookiesSet()[0]?.options).toMatchObject({ secure: true });
  });

  it.each(['https://evil.example', '//evil.example', '/\\evil.example', 'javascript:alert(1)', ''])(
    'never go on to %j',
    async (next) => {
      arrive();
      expect(await redirectOf(signInAction(null, credentials(next)))).toBe('/');
    },
  );

  it('answer a refusal in words, by field, and set no cookie', async () => {
    arrive();
    expect(
      await signInAction(null, formOf({ email: owner.email, password: 'wrong' })),
    ).toMatchObject({ ok: false, message: expect.stringMatching(/do not go together/) });
    const blank = await signUpAction(null, formOf({ name: ' ', email: 'x', password: 'short' }));
    expect(blank).toMatchObject({
      ok: false,
      fields: { name: /./, email: /./, password: /./, teamName: /./ },
    });
    expect(cookiesSet()).toEqual([]);
  });

  it('keep what was not foreseen to the log', async () => {
    arrive(owner.sessionToken);
    const failing = formAction(async () => {
      throw new Error('a secret');
    });
    const state = await failing(null, {});
    expect(state).toMatchObject({ ok: false, message: expect.stringMatching(/went wrong/) });
    expect(JSON.stringify(state)).not.toContain('secret');
  });

  it('carry a form through and show its page anew', async () => {
    arrive(owner.sessionToken);
    const fields = { name: 'Wafer', material: 'Ge', carrier: 'holes', dopingPerCm3: '1,5e15' };
    const to = await redirectOf(createSampleAction(null, formOf({ ...fields, $ACTION_ID: 'x' })));
    const id = to.split('/').at(-1);
    expect(await read(readSample, { id })).toMatchObject({ dopingPerCm3: 1.5e15, notes: '' });
    expect(revalidated()).toEqual(['/']);
    const broken = await createSampleAction(null, formOf({ ...fields, dopingPerCm3: 'many' }));
    expect(broken).toMatchObject({ ok: false, fields: { dopingPerCm3: /./ } });
  });

  it('show the link of an invitation once, and let its holder in', async () => {
    arrive(owner.sessionToken);
    const state = await invitePersonAction(null, { email: 'guest@example.org', role: 'modeller' });
    if (!state?.ok) throw new Error('The invitation was refused.');
    const token = state.answer?.path.split('/').at(-1) ?? '';
    arrive();
    const accept = formOf({ token, name: 'Guest', password: PASSWORD });
    expect(await redirectOf(acceptInvitationAction(null, accept))).toBe('/');
    const session = await readSession(database.db, cookiesSet()[0]?.value ?? '');
    expect(session?.viewer).toMatchObject({ role: 'modeller', name: 'Guest' });
  });

  it('are refused signed out', async () => {
    arrive();
    for (const action of [createSampleAction, switchTeamAction, revokeSessionAction])
      expect(await action(null, {})).toMatchObject({ ok: false, message: 'Sign in first.' });
  });

  it('sign out here and on the server, also when the session is gone already', async () => {
    const person = await personWithTeam(database);
    arrive(person.sessionToken);
    expect(await redirectOf(signOutAction(null, {}))).toBe('/sign-in');
    expect(cookiesSet()[0]).toMatchObject({ name: SESSION_COOKIE, value: '' });
    expect(await readSession(database.db, person.sessionToken)).toBeNull();
    arrive(person.sessionToken);
    expect(await redirectOf(signOutAction(null, {}))).toBe('/sign-in');
  });

  describe('pages read', () => {
    it('and send whoever is signed out to sign in and back', async () => {
      arrive(undefined, { [PATH_HEADER]: '/samples?archived=true' });
      expect(await redirectOf(read(listSamples))).toBe(
        '/sign-in?next=%2Fsamples%3Farchived%3Dtrue',
      );
    });

    it('and find nothing at an address that is not theirs, or none', async () => {
      arrive(owner.sessionToken);
      for (const id of [crypto.randomUUID(), 'x'])
        await expect(read(readSample, { id })).rejects.toBeInstanceOf(NotFound);
    });
  });
});
