import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { fits } from '@/db/schema/fits';
import { scans } from '@/db/schema/scans';
import { listFitsSchema, type FitRow } from '@/lib/schemas/fit';
import { and, eq } from 'drizzle-orm';

import { fitRows } from './fit-rows';

export async function listFits(ctx: Context, input: unknown): Promise<FitRow[]> {
  const viewer = allow(ctx, 'read');
  const { scanId, sampleId, state } = parse(listFitsSchema, input);
  const where = and(
    scanId === undefined ? undefined : eq(fits.scanId, scanId),
    sampleId === undefined ? undefined : eq(scans.sampleId, sampleId),
    state === undefined ? undefined : eq(fits.state, state),
  );
  return fitRows(ctx.db, viewer.teamId, where);
}
