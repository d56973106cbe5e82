import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { sha256 } from '@/db/access/sha256';
import { transaction } from '@/db/access/transaction';
import { invitations } from '@/db/schema/invitations';
import { memberships } from '@/db/schema/memberships';
import { users } from '@/db/schema/users';
import { AppError } from '@/lib/errors';
import { invitePersonSchema } from '@/lib/schemas/team';
import { and, eq, isNull } from 'drizzle-orm';
import { randomBytes, randomUUID } from 'node:crypto';

const VALID_FOR_MS = 7 * 24 * 60 * 60 * 1000;

/** Answers the link, which is shown once: only its hash is kept. */
export async function invitePerson(ctx: Context, input: unknown): Promise<{ path: string }> {
  const viewer = allow(ctx, 'manage team');
  const { email, role } = parse(invitePersonSchema, input);
  const token = randomBytes(32).toString('base64url');
  await transaction(ctx, async (tx) => {
    const [member] = await tx
      .select({ id: users.id })
      .from(memberships)
      .innerJoin(users, eq(users.id, memberships.userId))
      .where(and(eq(memberships.teamId, viewer.teamId), eq(users.email, email)));
    if (member !== undefined) {
      const message = 'This person is in the team already.';
      throw new AppError('conflict', message, { email: message });
    }
    // A new link replaces an open one for the same address.
    await tx
      .update(invitations)
      .set({ cancelledAt: ctx.now })
      .where(
        and(
          eq(invitations.teamId, viewer.teamId),
          eq(invitations.email, email),
          isNull(invitations.acceptedAt),
          isNull(invitations.cancelledAt),
        ),
      );
    await tx.insert(invitations).values({
      id: randomUUID(),
      teamId: viewer.teamId,
      email,
      role,
      tokenSha256: sha256(token),
      createdById: viewer.userId,
      createdAt: ctx.now,
      expiresAt: new Date(ctx.now.getTime() + VALID_FOR_MS),
    });
    await audit(tx, {
      by: viewer,
      at: ctx.now,
      verb: 'invite-person',
      subject: `${email} as ${role}`,
    });
  });
  return { path: `/invitation/${token}` };
}
