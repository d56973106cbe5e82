import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { signedIn } from '@/db/access/policy';
import { sessions } from '@/db/schema/sessions';
import { AppError } from '@/lib/errors';
import { switchTeamSchema } from '@/lib/schemas/team';
import { and, eq } from 'drizzle-orm';

/** Works in another team of the viewer's from now on, in this browser. */
export async function switchTeam(ctx: Context, input: unknown): Promise<null> {
  const viewer = signedIn(ctx);
  const { teamId } = parse(switchTeamSchema, input);
  if (!viewer.teams.some((team) => team.id === teamId))
    throw new AppError('not_found', 'You are not in this team.');
  await ctx.db
    .update(sessions)
    .set({ teamId })
    .where(and(eq(sessions.id, ctx.sessionId ?? ''), eq(sessions.userId, viewer.userId)));
  return null;
}
