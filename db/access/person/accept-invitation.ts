import { countSignIn } from '@/db/access/attempt-limit';
import { audit } from '@/db/access/audit';
import type { Context, Handle } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { hashPassword, passwordMatches } from '@/db/access/password';
import { startSession, type StartedSession } from '@/db/access/session';
import { transaction } from '@/db/access/transaction';
import { invitations } from '@/db/schema/invitations';
import { memberships } from '@/db/schema/memberships';
import { users } from '@/db/schema/users';
import { AppError } from '@/lib/errors';
import { acceptInvitationSchema } from '@/lib/schemas/person';
import { eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';

import { openInvitation } from './open-invitation';

/** Joins a team: a new person gives name and password, a known one proves the password. */
export async function acceptInvitation(ctx: Context, input: unknown): Promise<StartedSession> {
  const { token, name, password } = parse(acceptInvitationSchema, input);
  const { invitation, person } = await openInvitation(ctx.db, token, ctx.now);
  await countSignIn(invitation.email, ctx.clientKey);
  if (person === null && name === '') refuse('invalid', 'name', 'Name: write something here.');
  if (person !== null && !(await passwordMatches(person.passwordHash, password)))
    refuse('unauthenticated', 'password', 'This is not the password of your account.');
  const passwordHash = person?.passwordHash ?? (await hashPassword(password));

  return transaction(ctx, async (tx) => {
    // Read again: of two people with the link, one comes first.
    const { person: known, teamName } = await openInvitation(tx, token, ctx.now);
    if ((known === null) !== (person === null))
      throw new AppError('conflict', 'This address got an account just now. Open the link again.');
    const userId =
      known?.id ?? (await addPerson(tx, { ...invitation, name, passwordHash }, ctx.now));
    const by = { userId, teamId: invitation.teamId };
    await tx
      .insert(memberships)
      .values({ ...by, role: invitation.role, joinedAt: ctx.now })
      .onConflictDoNothing();
    await tx
      .update(invitations)
      .set({ acceptedAt: ctx.now })
      .where(eq(invitations.id, invitation.id));
    await audit(tx, { by, at: ctx.now, verb: 'accept-invitation', subject: teamName });
    return startSession(tx, ctx, by);
  });
}

async function addPerson(
  tx: Handle,
  person: { email: string; name: string; passwordHash: string },
  now: Date,
): Promise<string> {
  const { email, name, passwordHash } = person;
  const id = randomUUID();
  await tx.insert(users).values({ id, email, name, passwordHash, createdAt: now });
  return id;
}

function refuse(code: 'invalid' | 'unauthenticated', field: string, message: string): never {
  throw new AppError(code, message, { [field]: message });
}
