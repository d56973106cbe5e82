import type { Context } from '@/db/access/context';
import { luciaOn } from '@/db/access/lucia';
import { signedIn } from '@/db/access/policy';
import type { SessionRow } from '@/lib/schemas/person';

/** Where the viewer is signed in, newest first. */
export async function listSessions(ctx: Context, _input: unknown): Promise<SessionRow[]> {
  const viewer = signedIn(ctx);
  const sessions = await luciaOn(ctx.db).getUserSessions(viewer.userId);
  return sessions
    .sort((a, b) => b.createdAt.getTime() - a.createdAt.getTime())
    .map((session) => ({
      id: session.id,
      current: session.id === ctx.sessionId,
      device: session.device,
      createdAt: session.createdAt.toISOString(),
      expiresAt: session.expiresAt.toISOString(),
    }));
}
