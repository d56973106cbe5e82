import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { samples } from '@/db/schema/samples';
import { AppError } from '@/lib/errors';
import { editSampleSchema } from '@/lib/schemas/sample';
import { and, eq } from 'drizzle-orm';

export async function editSample(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const { id, ...sample } = parse(editSampleSchema, input);
  return transaction(ctx, async (tx) => {
    const edited = await tx
      .update(samples)
      .set(sample)
      .where(and(eq(samples.id, id), eq(samples.teamId, viewer.teamId)))
      .returning({ id: samples.id });
    if (edited.length === 0) throw new AppError('not_found', 'There is no such sample.');
    await audit(tx, { by: viewer, at: ctx.now, verb: 'edit-sample', subject: sample.name });
    return { id };
  });
}
