import type { Context } from '@/db/access/context';
import { acceptInvitation } from '@/db/access/person/accept-invitation';
import { signUp } from '@/db/access/person/sign-up';
import { readSession, type StartedSession } from '@/db/access/session';
import { invitePerson } from '@/db/access/team/invite-person';
import type { DemoData, DemoPerson } from '@/db/demo/types';
import type { Viewer } from '@/lib/schemas/person';

import { DEMO_PASSWORD } from './demo-password';
import type { As, Store } from './store';

/** Work in the demo goes on over some three weeks that end now. */
const SPAN_MS = 21 * 24 * 60 * 60 * 1000;
const STEP_MS = 5 * 60 * 60 * 1000;

export interface SeededPeople {
  as: As;
  teamId: string;
  userIds: string[];
}

/** The owner signs up; the others come by invitation. */
export async function seedPeople(store: Store, demo: DemoData): Promise<SeededPeople> {
  const viewers: Record<string, Viewer> = {};
  const request = requestsOf(store);
  const as = (key: string) => request(viewers[key] ?? null);
  const [owner, ...others] = [...demo.people].sort(ownerFirst);
  if (owner === undefined) throw new Error('The demo team has nobody.');

  const { email, name } = owner;
  const credentials = { email, name, password: DEMO_PASSWORD };
  const started = await signUp(request(null), { ...credentials, teamName: demo.team.name });
  viewers[owner.key] = await viewerOf(store, started);
  for (const person of others) {
    const { path } = await invitePerson(as(owner.key), { email: person.email, role: person.role });
    const token = path.split('/').at(-1);
    const accepted = { token, name: person.name, password: DEMO_PASSWORD };
    viewers[person.key] = await viewerOf(store, await acceptInvitation(request(null), accepted));
  }
  const all = Object.values(viewers);
  return { as, teamId: all[0]?.teamId ?? '', userIds: all.map(({ userId }) => userId) };
}

function requestsOf({ db, queue }: Store): (viewer: Viewer | null) => Context {
  let at = Date.now() - SPAN_MS;
  return (viewer) => {
    at = Math.min(at + STEP_MS, Date.now());
    const who = { viewer, sessionId: null, clientKey: 'seed', device: 'Demo seed' };
    return { db, queue, now: new Date(at), ...who };
  };
}

async function viewerOf({ db }: Store, { sessionToken }: StartedSession): Promise<Viewer> {
  const session = await readSession(db, sessionToken);
  if (session === null) throw new Error('A seeded person could not sign in.');
  return session.viewer;
}

function ownerFirst(a: DemoPerson, b: DemoPerson): number {
  return Number(b.role === 'owner') - Number(a.role === 'owner');
}
