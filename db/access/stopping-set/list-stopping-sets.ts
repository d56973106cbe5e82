import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { listStoppingSetsSchema, type StoppingSetRow } from '@/lib/schemas/stopping-set';
import { isNotNull, isNull } from 'drizzle-orm';

import { stoppingSetRows } from './stopping-set-rows';

export async function listStoppingSets(ctx: Context, input: unknown): Promise<StoppingSetRow[]> {
  const viewer = allow(ctx, 'read');
  const { archived } = parse(listStoppingSetsSchema, input);
  const inDrawer = archived ? isNotNull(stoppingSets.archivedAt) : isNull(stoppingSets.archivedAt);
  return stoppingSetRows(ctx.db, viewer.teamId, inDrawer);
}
