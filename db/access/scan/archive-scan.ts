import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { scans } from '@/db/schema/scans';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import { and, eq } from 'drizzle-orm';

/** Out of the lists, never out of the database; restoring undoes it. */
export async function archiveScan(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const { id } = parse(byIdSchema, input);
  return transaction(ctx, async (tx) => {
    const [archived] = await tx
      .update(scans)
      .set({ archivedAt: ctx.now })
      .where(and(eq(scans.id, id), eq(scans.teamId, viewer.teamId)))
      .returning({ name: scans.name });
    if (archived === undefined) throw new AppError('not_found', 'There is no such scan.');
    await audit(tx, { by: viewer, at: ctx.now, verb: 'archive-scan', subject: archived.name });
    return { id };
  });
}
