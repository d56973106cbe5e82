import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { samples } from '@/db/schema/samples';
import { sampleInputSchema } from '@/lib/schemas/sample';
import { randomUUID } from 'node:crypto';

export async function createSample(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const sample = parse(sampleInputSchema, input);
  const id = randomUUID();
  await transaction(ctx, async (tx) => {
    await tx.insert(samples).values({
      ...sample,
      id,
      teamId: viewer.teamId,
      createdAt: ctx.now,
      createdById: viewer.userId,
    });
    await audit(tx, { by: viewer, at: ctx.now, verb: 'create-sample', subject: sample.name });
  });
  return { id };
}
