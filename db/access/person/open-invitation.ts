import type { Handle } from '@/db/access/context';
import { sha256 } from '@/db/access/sha256';
import { invitations } from '@/db/schema/invitations';
import { teams } from '@/db/schema/teams';
import { users } from '@/db/schema/users';
import { AppError } from '@/lib/errors';
import { and, eq, gt, isNull } from 'drizzle-orm';

/** An invitation that was neither used nor cancelled and has not run out, or a refusal. */
export async function openInvitation(db: Handle, token: string, now: Date) {
  const [row] = await db
    .select({ invitation: invitations, teamName: teams.name, person: users })
    .from(invitations)
    .innerJoin(teams, eq(teams.id, invitations.teamId))
    .leftJoin(users, eq(users.email, invitations.email))
    .where(
      and(
        eq(invitations.tokenSha256, sha256(token)),
        isNull(invitations.acceptedAt),
        isNull(invitations.cancelledAt),
        gt(invitations.expiresAt, now),
      ),
    );
  if (row === undefined)
    throw new AppError(
      'not_found',
      'This invitation was used, cancelled or has run out. Ask for a new one.',
    );
  return row;
}
