import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { readInvitationSchema, type Invitation } from '@/lib/schemas/person';

import { openInvitation } from './open-invitation';

/** What an invitation offers, for whoever holds its link. */
export async function readInvitation(ctx: Context, input: unknown): Promise<Invitation> {
  const { token } = parse(readInvitationSchema, input);
  const { invitation, teamName, person } = await openInvitation(ctx.db, token, ctx.now);
  return { email: invitation.email, role: invitation.role, teamName, known: person !== null };
}
