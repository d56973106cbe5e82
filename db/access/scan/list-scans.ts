import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { scans } from '@/db/schema/scans';
import { listScansSchema, type Scan } from '@/lib/schemas/scan';
import { and, eq, isNotNull, isNull } from 'drizzle-orm';

import { scanRows } from './scan-rows';

export async function listScans(ctx: Context, input: unknown): Promise<Scan[]> {
  const viewer = allow(ctx, 'read');
  const { sampleId, archived } = parse(listScansSchema, input);
  const inDrawer = archived ? isNotNull(scans.archivedAt) : isNull(scans.archivedAt);
  const ofSample = sampleId === undefined ? undefined : eq(scans.sampleId, sampleId);
  return scanRows(ctx.db, viewer.teamId, and(inDrawer, ofSample));
}
