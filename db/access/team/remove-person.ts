import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { memberships } from '@/db/schema/memberships';
import { removePersonSchema } from '@/lib/schemas/team';
import { and, eq } from 'drizzle-orm';

import { memberOf, refuseLastOwner } from './member';

/** Takes a person out of the team. What the person made stays, under the same name. */
export async function removePerson(ctx: Context, input: unknown): Promise<null> {
  const viewer = allow(ctx, 'manage team');
  const { userId } = parse(removePersonSchema, input);
  return transaction(ctx, async (tx) => {
    const member = await memberOf(tx, viewer.teamId, userId);
    await refuseLastOwner(tx, viewer.teamId, member);
    await tx
      .delete(memberships)
      .where(and(eq(memberships.teamId, viewer.teamId), eq(memberships.userId, userId)));
    await audit(tx, { by: viewer, at: ctx.now, verb: 'remove-person', subject: member.name });
    return null;
  });
}
