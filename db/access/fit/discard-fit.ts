import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow, allowDiscard } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { fits } from '@/db/schema/fits';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import { and, eq } from 'drizzle-orm';

import { ownedFit } from './owned-fit';

/** Deletes a draft for good, with its comments. Whatever was ever submitted stays. */
export async function discardFit(ctx: Context, input: unknown): Promise<null> {
  const viewer = allow(ctx, 'fit');
  const { id } = parse(byIdSchema, input);
  return transaction(ctx, async (tx) => {
    const fit = await ownedFit(tx, viewer.teamId, id);
    allowDiscard(viewer, fit);
    const [child] = await tx.select({ name: fits.name }).from(fits).where(eq(fits.parentFitId, id));
    if (child !== undefined)
      throw new AppError('conflict', `The fit “${child.name}” came from this one, so it stays.`);
    const discarded = await tx
      .delete(fits)
      .where(and(eq(fits.id, id), eq(fits.teamId, viewer.teamId), eq(fits.state, 'draft')))
      .returning({ id: fits.id });
    if (discarded.length === 0) throw new AppError('conflict', 'Only a draft can be discarded.');
    await audit(tx, { by: viewer, at: ctx.now, verb: 'discard-fit', subject: fit.name });
    return null;
  });
}
