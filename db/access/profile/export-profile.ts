import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { fullFits } from '@/db/access/fit/full-fits';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { profileExports } from '@/db/schema/profile-exports';
import { AppError } from '@/lib/errors';
import { profileCsv } from '@/lib/files/write-profile-csv';
import { exportProfileSchema } from '@/lib/schemas/profile';
import { eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';

import { exportHead } from './export-head';
import { issuedProfileRows } from './issued-profile-rows';
import { uniformProfile } from './uniform-profile';

/** An issued profile as CSV; who took it, when and how is kept. */
export async function exportProfile(
  ctx: Context,
  input: unknown,
): Promise<{ fileName: string; csv: string }> {
  const viewer = allow(ctx, 'export');
  const { id, grid, stepNm, depthUnit, concentrationUnit } = parse(exportProfileSchema, input);
  const [row] = await issuedProfileRows(ctx.db, viewer.teamId, eq(issuedProfiles.id, id));
  const [fit] = row === undefined ? [] : await fullFits(ctx.db, viewer, [row.fitId]);
  if (row === undefined || fit === undefined)
    throw new AppError('not_found', 'There is no such issued profile.');
  const profile =
    grid === 'uniform' ? await uniformProfile(ctx.db, fit, stepNm) : fit.carrierProfile;
  const gridWords = grid === 'uniform' ? `uniform, ${stepNm} nm` : 'fit grid';
  const csv = profileCsv({
    head: exportHead(row, fit, viewer.teamName),
    profile,
    depthUnit,
    concentrationUnit,
    grid: gridWords,
  });
  await transaction(ctx, async (tx) => {
    const units = `${gridWords}; ${depthUnit}, ${concentrationUnit}`;
    await tx.insert(profileExports).values({
      id: randomUUID(),
      issuedProfileId: id,
      personId: viewer.userId,
      at: ctx.now,
      grid: units,
    });
    const subject = `${row.number} (${units})`;
    await audit(tx, { by: viewer, at: ctx.now, verb: 'export-profile', subject });
  });
  return { fileName: `${row.number}.csv`, csv };
}
