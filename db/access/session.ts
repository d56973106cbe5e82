import 'server-only';

import { memberships } from '@/db/schema/memberships';
import { teams } from '@/db/schema/teams';
import type { Viewer } from '@/lib/schemas/person';
import { asc, eq } from 'drizzle-orm';
import { randomBytes } from 'node:crypto';

import type { Context, Handle } from './context';
import { luciaOn } from './lucia';
import { sha256 } from './sha256';

export interface StartedSession {
  /** Goes into the cookie and is kept nowhere. */
  sessionToken: string;
  expiresAt: string;
}

/** A new session in a team; the one that the browser had before ends. */
export async function startSession(
  tx: Handle,
  ctx: Context,
  who: { userId: string; teamId: string },
): Promise<StartedSession> {
  const lucia = luciaOn(tx);
  if (ctx.sessionId !== null) await lucia.invalidateSession(ctx.sessionId);
  const sessionToken = randomBytes(32).toString('base64url');
  const attributes = { createdAt: ctx.now, device: ctx.device, teamId: who.teamId };
  const session = await lucia.createSession(who.userId, attributes, {
    sessionId: sha256(sessionToken),
  });
  return { sessionToken, expiresAt: session.expiresAt.toISOString() };
}

/** Who holds this token. A person who is in no team any more counts as signed out. */
export async function readSession(
  db: Handle,
  sessionToken: string,
): Promise<{ viewer: Viewer; sessionId: string } | null> {
  const { session, user } = await luciaOn(db).validateSession(sha256(sessionToken));
  if (session === null) return null;
  const joined = await teamsOf(db, user.id);
  const active = joined.find((team) => team.id === session.teamId) ?? joined[0];
  if (active === undefined) return null;
  const viewer = {
    userId: user.id,
    name: user.name,
    email: user.email,
    teamId: active.id,
    teamName: active.name,
    role: active.role,
    invented: active.invented,
    teams: joined.map(({ id, name, role }) => ({ id, name, role })),
  };
  return { viewer, sessionId: session.id };
}

/** The teams of a person, the one joined first in front. */
export async function teamsOf(db: Handle, userId: string) {
  return db
    .select({
      id: teams.id,
      name: teams.name,
      role: memberships.role,
      invented: teams.invented,
    })
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .where(eq(memberships.userId, userId))
    .orderBy(asc(memberships.joinedAt), asc(teams.id));
}
