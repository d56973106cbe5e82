import type { Context } from '@/db/access/context';
import { fitRows } from '@/db/access/fit/fit-rows';
import { allow } from '@/db/access/policy';
import { fits } from '@/db/schema/fits';
import type { FitRow } from '@/lib/schemas/fit';
import { asc, eq } from 'drizzle-orm';

/** What waits for a decision, the longest first. */
export async function listReviews(ctx: Context, _input: unknown): Promise<FitRow[]> {
  const viewer = allow(ctx, 'read');
  const options = { orderBy: asc(fits.submittedAt) };
  return fitRows(ctx.db, viewer.teamId, eq(fits.state, 'submitted'), options);
}
