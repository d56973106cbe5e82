import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { invitations } from '@/db/schema/invitations';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import { and, eq, isNull } from 'drizzle-orm';

export async function cancelInvitation(ctx: Context, input: unknown): Promise<null> {
  const viewer = allow(ctx, 'manage team');
  const { id } = parse(byIdSchema, input);
  return transaction(ctx, async (tx) => {
    const [cancelled] = await tx
      .update(invitations)
      .set({ cancelledAt: ctx.now })
      .where(
        and(
          eq(invitations.id, id),
          eq(invitations.teamId, viewer.teamId),
          isNull(invitations.acceptedAt),
          isNull(invitations.cancelledAt),
        ),
      )
      .returning({ email: invitations.email });
    if (cancelled === undefined)
      throw new AppError('not_found', 'This invitation is not open any more.');
    await audit(tx, {
      by: viewer,
      at: ctx.now,
      verb: 'cancel-invitation',
      subject: cancelled.email,
    });
    return null;
  });
}
