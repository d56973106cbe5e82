import { audit } from '@/db/access/audit';
import { pointsSha256 } from '@/db/access/content-hash';
import type { Context } from '@/db/access/context';
import { storeFile } from '@/db/access/file/store-file';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { AppError } from '@/lib/errors';
import { createScanSchema } from '@/lib/schemas/scan';
import { and, eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';

import { pointsFromSource } from './points-from-source';

export async function createScan(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const wanted = parse(createScanSchema, input);
  const content = pointsFromSource(wanted);
  const id = randomUUID();
  await transaction(ctx, async (tx) => {
    const [sample] = await tx
      .select({ name: samples.name })
      .from(samples)
      .where(and(eq(samples.id, wanted.sampleId), eq(samples.teamId, viewer.teamId)));
    if (sample === undefined) throw new AppError('not_found', 'There is no such sample.');
    const fileId =
      wanted.source.kind === 'file'
        ? await storeFile(tx, { ...viewer, now: ctx.now, ...wanted.source })
        : null;
    await tx.insert(scans).values({
      ...wanted.meta,
      ...content,
      id,
      teamId: viewer.teamId,
      sampleId: wanted.sampleId,
      pointsSha256: pointsSha256(content.points),
      fileId,
      createdAt: ctx.now,
      createdById: viewer.userId,
    });
    const subject = `${sample.name}: ${wanted.meta.name}`;
    await audit(tx, { by: viewer, at: ctx.now, verb: 'create-scan', subject });
  });
  return { id };
}
