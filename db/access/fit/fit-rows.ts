import type { Handle } from '@/db/access/context';
import { fits } from '@/db/schema/fits';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { users } from '@/db/schema/users';
import type { FitRow } from '@/lib/schemas/fit';
import { and, desc, eq, sql, type SQL } from 'drizzle-orm';

interface ListOptions {
  /** Newest first unless given. */
  orderBy?: SQL;
  limit?: number;
}

export const fitRowColumns = {
  id: fits.id,
  name: fits.name,
  state: fits.state,
  sampleId: samples.id,
  sampleName: samples.name,
  scanId: fits.scanId,
  scanName: scans.name,
  stoppingSetId: fits.stoppingSetId,
  stoppingSetName: stoppingSets.name,
  profile: fits.profile,
  edge: fits.edge,
  width: fits.width,
  chiSquare: fits.chiSquare,
  degreesOfFreedom: fits.degreesOfFreedom,
  aicc: fits.aicc,
  createdBy: users.name,
  createdById: fits.createdById,
  createdAt: fits.createdAt,
  /** Whatever follows from invented data is invented. */
  invented: sql<number>`(${scans.invented} or ${stoppingSets.invented})`,
  issuedProfileId: issuedProfiles.id,
  issuedNumber: issuedProfiles.number,
};

/** Fits of a team, without what a list does not show. */
export async function fitRows(
  db: Handle,
  teamId: string,
  where: SQL | undefined,
  { orderBy = desc(fits.createdAt), limit = 1000 }: ListOptions = {},
): Promise<FitRow[]> {
  const rows = await db
    .select(fitRowColumns)
    .from(fits)
    .innerJoin(scans, eq(scans.id, fits.scanId))
    .innerJoin(samples, eq(samples.id, scans.sampleId))
    .innerJoin(stoppingSets, eq(stoppingSets.id, fits.stoppingSetId))
    .innerJoin(users, eq(users.id, fits.createdById))
    .leftJoin(issuedProfiles, eq(issuedProfiles.fitId, fits.id))
    .where(and(eq(fits.teamId, teamId), where))
    .orderBy(orderBy)
    .limit(limit);
  return rows.map(({ createdAt, invented, ...row }) => ({
    ...row,
    createdAt: createdAt.toISOString(),
    invented: Boolean(invented),
  }));
}
