import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import { and, eq } from 'drizzle-orm';

/** Back into the lists. */
export async function restoreStoppingSet(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const { id } = parse(byIdSchema, input);
  return transaction(ctx, async (tx) => {
    const [restored] = await tx
      .update(stoppingSets)
      .set({ archivedAt: null })
      .where(and(eq(stoppingSets.id, id), eq(stoppingSets.teamId, viewer.teamId)))
      .returning({ name: stoppingSets.name });
    if (restored === undefined) throw new AppError('not_found', 'There is no such stopping set.');
    await audit(tx, {
      by: viewer,
      at: ctx.now,
      verb: 'restore-stopping-set',
      subject: restored.name,
    });
    return { id };
  });
}
