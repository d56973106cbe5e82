import type { Context } from '@/db/access/context';
import { luciaOn } from '@/db/access/lucia';
import { signedIn } from '@/db/access/policy';

/** Ends the session of this browser. */
export async function signOut(ctx: Context, _input: unknown): Promise<null> {
  signedIn(ctx);
  if (ctx.sessionId !== null) await luciaOn(ctx.db).invalidateSession(ctx.sessionId);
  return null;
}
