import type { Handle } from '@/db/access/context';
import { fits } from '@/db/schema/fits';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { users } from '@/db/schema/users';
import type { IssuedProfileRow } from '@/lib/schemas/profile';
import { and, desc, eq, sql, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';

const fitters = alias(users, 'fitters');

/** Issued profiles of a team, the newest number first. */
export async function issuedProfileRows(
  db: Handle,
  teamId: string,
  where: SQL | undefined,
  limit = 1000,
): Promise<IssuedProfileRow[]> {
  const rows = await db
    .select({
      id: issuedProfiles.id,
      number: issuedProfiles.number,
      fitId: fits.id,
      fitName: fits.name,
      sampleId: samples.id,
      sampleName: samples.name,
      material: samples.material,
      scanName: scans.name,
      profile: fits.profile,
      edge: fits.edge,
      width: fits.width,
      issuedAt: issuedProfiles.issuedAt,
      issuedBy: users.name,
      fittedBy: fitters.name,
      invented: sql<number>`(${scans.invented} or ${stoppingSets.invented})`,
    })
    .from(issuedProfiles)
    .innerJoin(fits, eq(fits.id, issuedProfiles.fitId))
    .innerJoin(scans, eq(scans.id, fits.scanId))
    .innerJoin(samples, eq(samples.id, scans.sampleId))
    .innerJoin(stoppingSets, eq(stoppingSets.id, fits.stoppingSetId))
    .innerJoin(users, eq(users.id, issuedProfiles.issuedById))
    .innerJoin(fitters, eq(fitters.id, fits.createdById))
    .where(and(eq(issuedProfiles.teamId, teamId), where))
    .orderBy(desc(issuedProfiles.year), desc(issuedProfiles.sequence))
    .limit(limit);
  return rows.map(({ issuedAt, invented, ...row }) => ({
    ...row,
    issuedAt: issuedAt.toISOString(),
    invented: Boolean(invented),
  }));
}
