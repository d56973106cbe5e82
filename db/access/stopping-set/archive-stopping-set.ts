import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import { and, eq } from 'drizzle-orm';

/** Out of the lists, never out of the database; restoring undoes it. */
export async function archiveStoppingSet(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const { id } = parse(byIdSchema, input);
  return transaction(ctx, async (tx) => {
    const [archived] = await tx
      .update(stoppingSets)
      .set({ archivedAt: ctx.now })
      .where(and(eq(stoppingSets.id, id), eq(stoppingSets.teamId, viewer.teamId)))
      .returning({ name: stoppingSets.name });
    if (archived === undefined) throw new AppError('not_found', 'There is no such stopping set.');
    await audit(tx, {
      by: viewer,
      at: ctx.now,
      verb: 'archive-stopping-set',
      subject: archived.name,
    });
    return { id };
  });
}
