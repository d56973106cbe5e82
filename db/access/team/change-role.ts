import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { memberships } from '@/db/schema/memberships';
import { changeRoleSchema } from '@/lib/schemas/team';
import { and, eq } from 'drizzle-orm';

import { memberOf, refuseLastOwner } from './member';

export async function changeRole(ctx: Context, input: unknown): Promise<null> {
  const viewer = allow(ctx, 'manage team');
  const { userId, role } = parse(changeRoleSchema, input);
  return transaction(ctx, async (tx) => {
    const member = await memberOf(tx, viewer.teamId, userId);
    if (role !== 'owner') await refuseLastOwner(tx, viewer.teamId, member);
    await tx
      .update(memberships)
      .set({ role })
      .where(and(eq(memberships.teamId, viewer.teamId), eq(memberships.userId, userId)));
    const subject = `${member.name}: ${member.role} to ${role}`;
    await audit(tx, { by: viewer, at: ctx.now, verb: 'change-role', subject });
    return null;
  });
}
