import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { AppError } from '@/lib/errors';
import { editStoppingSetSchema } from '@/lib/schemas/stopping-set';
import { and, eq } from 'drizzle-orm';

/** Names and notes only: other profiles are another set. */
export async function editStoppingSet(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const { id, meta } = parse(editStoppingSetSchema, input);
  return transaction(ctx, async (tx) => {
    const edited = await tx
      .update(stoppingSets)
      .set(meta)
      .where(and(eq(stoppingSets.id, id), eq(stoppingSets.teamId, viewer.teamId)))
      .returning({ id: stoppingSets.id });
    if (edited.length === 0) throw new AppError('not_found', 'There is no such stopping set.');
    await audit(tx, { by: viewer, at: ctx.now, verb: 'edit-stopping-set', subject: meta.name });
    return { id };
  });
}
