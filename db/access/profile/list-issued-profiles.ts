import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { fits } from '@/db/schema/fits';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { listIssuedProfilesSchema, type IssuedProfileRow } from '@/lib/schemas/profile';
import { and, or, sql, type SQL } from 'drizzle-orm';

import { issuedProfileRows } from './issued-profile-rows';

export async function listIssuedProfiles(
  ctx: Context,
  input: unknown,
): Promise<IssuedProfileRow[]> {
  const viewer = allow(ctx, 'read');
  const { query } = parse(listIssuedProfilesSchema, input);
  const words = query.split(/\s+/).filter((word) => word !== '');
  return issuedProfileRows(ctx.db, viewer.teamId, and(...words.map(namesWord)));
}

/** instr and not like: a % or _ that someone types is a letter as any other. */
function namesWord(word: string): SQL | undefined {
  const places = [issuedProfiles.number, samples.name, samples.material, scans.name, fits.name];
  return or(...places.map((place) => sql`instr(lower(${place}), lower(${word})) > 0`));
}
