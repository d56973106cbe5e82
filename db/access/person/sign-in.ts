import { countSignIn, forgetSignIns } from '@/db/access/attempt-limit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { passwordMatches } from '@/db/access/password';
import { startSession, teamsOf, type StartedSession } from '@/db/access/session';
import { transaction } from '@/db/access/transaction';
import { users } from '@/db/schema/users';
import { AppError } from '@/lib/errors';
import { signInSchema } from '@/lib/schemas/person';
import { eq } from 'drizzle-orm';

export async function signIn(ctx: Context, input: unknown): Promise<StartedSession> {
  const { email, password } = parse(signInSchema, input);
  await countSignIn(email, ctx.clientKey);
  const [person] = await ctx.db.select().from(users).where(eq(users.email, email));
  const matches = await passwordMatches(person?.passwordHash ?? null, password);
  if (person === undefined || !matches)
    throw new AppError('unauthenticated', 'This address and password do not go together.');
  await forgetSignIns(email, ctx.clientKey);
  const [team] = await teamsOf(ctx.db, person.id);
  if (team === undefined)
    throw new AppError('forbidden', 'You are in no team any more. Ask an owner for an invitation.');
  return transaction(ctx, (tx) => startSession(tx, ctx, { userId: person.id, teamId: team.id }));
}
