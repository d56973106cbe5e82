import type { Context } from '@/db/access/context';
import { fullFits } from '@/db/access/fit/full-fits';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { profileExports } from '@/db/schema/profile-exports';
import { users } from '@/db/schema/users';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import type { IssuedProfile } from '@/lib/schemas/profile';
import { desc, eq } from 'drizzle-orm';

import { citationOf } from './citation';
import { issuedProfileRows } from './issued-profile-rows';

export async function readIssuedProfile(ctx: Context, input: unknown): Promise<IssuedProfile> {
  const viewer = allow(ctx, 'read');
  const { id } = parse(byIdSchema, input);
  const [row] = await issuedProfileRows(ctx.db, viewer.teamId, eq(issuedProfiles.id, id));
  const [fit] = row === undefined ? [] : await fullFits(ctx.db, viewer, [row.fitId]);
  if (row === undefined || fit === undefined)
    throw new AppError('not_found', 'There is no such issued profile.');
  const citation = citationOf(row, viewer.teamName);
  return { ...row, citation, fit, exports: await exportsOf(ctx, id) };
}

async function exportsOf(ctx: Context, id: string): Promise<IssuedProfile['exports']> {
  const rows = await ctx.db
    .select({ person: users.name, at: profileExports.at, grid: profileExports.grid })
    .from(profileExports)
    .innerJoin(users, eq(users.id, profileExports.personId))
    .where(eq(profileExports.issuedProfileId, id))
    .orderBy(desc(profileExports.at));
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}
