import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { scans } from '@/db/schema/scans';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import type { Scan } from '@/lib/schemas/scan';
import { eq } from 'drizzle-orm';

import { scanRows } from './scan-rows';

export async function readScan(ctx: Context, input: unknown): Promise<Scan> {
  const viewer = allow(ctx, 'read');
  const { id } = parse(byIdSchema, input);
  const [scan] = await scanRows(ctx.db, viewer.teamId, eq(scans.id, id));
  if (scan === undefined) throw new AppError('not_found', 'There is no such scan.');
  return scan;
}
