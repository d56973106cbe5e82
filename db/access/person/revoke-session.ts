import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { signedIn } from '@/db/access/policy';
import { sessions } from '@/db/schema/sessions';
import { AppError } from '@/lib/errors';
import { revokeSessionSchema } from '@/lib/schemas/person';
import { and, eq } from 'drizzle-orm';

/** Ends one of the viewer's own sessions, on whichever device. */
export async function revokeSession(ctx: Context, input: unknown): Promise<null> {
  const viewer = signedIn(ctx);
  const { id } = parse(revokeSessionSchema, input);
  const ended = await ctx.db
    .delete(sessions)
    .where(and(eq(sessions.id, id), eq(sessions.userId, viewer.userId)))
    .returning({ id: sessions.id });
  if (ended.length === 0) throw new AppError('not_found', 'This session has ended already.');
  return null;
}
