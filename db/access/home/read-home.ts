import type { Context } from '@/db/access/context';
import { fitRows } from '@/db/access/fit/fit-rows';
import { allow, mayAct } from '@/db/access/policy';
import { issuedProfileRows } from '@/db/access/profile/issued-profile-rows';
import { sampleRows } from '@/db/access/sample/sample-rows';
import { fits } from '@/db/schema/fits';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { stoppingSets } from '@/db/schema/stopping-sets';
import type { Home } from '@/lib/schemas/home';
import type { Viewer } from '@/lib/schemas/person';
import { and, eq, inArray, isNull, ne, notExists, or, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';

const SHOWN = 6;
const MOST_WAITING = 50;

export async function readHome(ctx: Context, _input: unknown): Promise<Home> {
  const viewer = allow(ctx, 'read');
  const shown = await sampleRows(ctx.db, viewer.teamId, isNull(samples.archivedAt));
  return {
    waiting: await waitingFor(ctx, viewer),
    recentFits: await fitRows(ctx.db, viewer.teamId, undefined, { limit: SHOWN }),
    recentProfiles: await issuedProfileRows(ctx.db, viewer.teamId, undefined, SHOWN),
    samples: shown,
    counts: await countsOf(ctx, viewer.teamId),
  };
}

/** Others' fits in review for who may decide; own drafts, and own returned fits not yet revised. */
async function waitingFor(ctx: Context, viewer: Viewer): Promise<Home['waiting']> {
  const reasons: SQL[] = [];
  const toDecide = and(eq(fits.state, 'submitted'), ne(fits.createdById, viewer.userId));
  if (mayAct(viewer, 'decide') && toDecide) reasons.push(toDecide);
  const revisions = alias(fits, 'revisions');
  const toFinish = and(
    inArray(fits.state, ['draft', 'returned']),
    eq(fits.createdById, viewer.userId),
    notExists(
      ctx.db.select({ id: revisions.id }).from(revisions).where(eq(revisions.parentFitId, fits.id)),
    ),
  );
  if (mayAct(viewer, 'fit') && toFinish) reasons.push(toFinish);
  if (reasons.length === 0) return [];
  return fitRows(ctx.db, viewer.teamId, or(...reasons), { limit: MOST_WAITING });
}

async function countsOf(ctx: Context, teamId: string): Promise<Home['counts']> {
  const live = (table: typeof samples | typeof scans | typeof stoppingSets) =>
    ctx.db.$count(table, and(eq(table.teamId, teamId), isNull(table.archivedAt)));
  return {
    samples: await live(samples),
    scans: await live(scans),
    stoppingSets: await live(stoppingSets),
    fits: await ctx.db.$count(fits, eq(fits.teamId, teamId)),
  };
}
