import { audit } from '@/db/access/audit';
import { pointsSha256 } from '@/db/access/content-hash';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { scans } from '@/db/schema/scans';
import { AppError } from '@/lib/errors';
import { editScanSchema } from '@/lib/schemas/scan';
import { and, eq } from 'drizzle-orm';

import { checkPoints } from './check-points';

/** Changes a scan; fits keep the points that they were frozen with, and the original file stays. */
export async function editScan(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const { id, meta, points } = parse(editScanSchema, input);
  return transaction(ctx, async (tx) => {
    const owned = and(eq(scans.id, id), eq(scans.teamId, viewer.teamId));
    const [scan] = await tx.select({ points: scans.points }).from(scans).where(owned);
    if (scan === undefined) throw new AppError('not_found', 'There is no such scan.');
    const kept = points ?? scan.points;
    checkPoints(kept, meta.observable);
    await tx
      .update(scans)
      .set({ ...meta, points: kept, pointsSha256: pointsSha256(kept) })
      .where(owned);
    const verb = points === null ? 'edit-scan' : 'edit-scan-points';
    await audit(tx, { by: viewer, at: ctx.now, verb, subject: meta.name });
    return { id };
  });
}
