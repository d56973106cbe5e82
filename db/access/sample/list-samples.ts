import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { samples } from '@/db/schema/samples';
import { listSamplesSchema, type SampleRow } from '@/lib/schemas/sample';
import { isNotNull, isNull } from 'drizzle-orm';

import { sampleRows } from './sample-rows';

export async function listSamples(ctx: Context, input: unknown): Promise<SampleRow[]> {
  const viewer = allow(ctx, 'read');
  const { archived } = parse(listSamplesSchema, input);
  const inDrawer = archived ? isNotNull(samples.archivedAt) : isNull(samples.archivedAt);
  return sampleRows(ctx.db, viewer.teamId, inDrawer);
}
