import { audit } from '@/db/access/audit';
import { countSignUp } from '@/db/access/attempt-limit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { hashPassword } from '@/db/access/password';
import { startSession, type StartedSession } from '@/db/access/session';
import { transaction } from '@/db/access/transaction';
import { memberships } from '@/db/schema/memberships';
import { teams } from '@/db/schema/teams';
import { users } from '@/db/schema/users';
import { AppError } from '@/lib/errors';
import { signUpSchema } from '@/lib/schemas/person';
import { eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';

/** Makes a person and a team that the person owns. */
export async function signUp(ctx: Context, input: unknown): Promise<StartedSession> {
  const wanted = parse(signUpSchema, input);
  await countSignUp(ctx.clientKey);
  const passwordHash = await hashPassword(wanted.password);
  return transaction(ctx, async (tx) => {
    const [taken] = await tx.select().from(users).where(eq(users.email, wanted.email));
    if (taken !== undefined) {
      const message = 'This address has an account already. Sign in instead.';
      throw new AppError('conflict', message, { email: message });
    }
    const who = { userId: randomUUID(), teamId: randomUUID() };
    await tx.insert(users).values({
      id: who.userId,
      email: wanted.email,
      name: wanted.name,
      passwordHash,
      createdAt: ctx.now,
    });
    await tx.insert(teams).values({ id: who.teamId, name: wanted.teamName, createdAt: ctx.now });
    await tx.insert(memberships).values({ ...who, role: 'owner', joinedAt: ctx.now });
    await audit(tx, { by: who, at: ctx.now, verb: 'sign-up', subject: wanted.teamName });
    return startSession(tx, ctx, who);
  });
}
