import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { samples } from '@/db/schema/samples';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import type { SampleRow } from '@/lib/schemas/sample';
import { eq } from 'drizzle-orm';

import { sampleRows } from './sample-rows';

export async function readSample(ctx: Context, input: unknown): Promise<SampleRow> {
  const viewer = allow(ctx, 'read');
  const { id } = parse(byIdSchema, input);
  const [sample] = await sampleRows(ctx.db, viewer.teamId, eq(samples.id, id));
  if (sample === undefined) throw new AppError('not_found', 'There is no such sample.');
  return sample;
}
