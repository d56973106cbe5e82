import type { Handle } from '@/db/access/context';
import { fits } from '@/db/schema/fits';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { users } from '@/db/schema/users';
import type { SampleRow } from '@/lib/schemas/sample';
import { and, asc, eq, getTableColumns, sql, type SQL } from 'drizzle-orm';

/** Samples of a team with what hangs on them; archived scans are not counted. */
export async function sampleRows(
  db: Handle,
  teamId: string,
  where: SQL | undefined,
): Promise<SampleRow[]> {
  const { teamId: _teamId, createdById: _createdById, ...columns } = getTableColumns(samples);
  const rows = await db
    .select({ ...columns, createdBy: users.name, ...counts })
    .from(samples)
    .innerJoin(users, eq(users.id, samples.createdById))
    .where(and(eq(samples.teamId, teamId), where))
    .orderBy(asc(sql`lower(${samples.name})`), asc(samples.createdAt));
  return rows.map((row) => ({
    ...row,
    archivedAt: row.archivedAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  }));
}

const counts = {
  scans: sql<number>`(select count(*) from ${scans}
    where ${scans.sampleId} = ${samples.id} and ${scans.archivedAt} is null)`,
  fits: sql<number>`(select count(*) from ${fits}
    join ${scans} on ${scans.id} = ${fits.scanId} where ${scans.sampleId} = ${samples.id})`,
  issuedProfiles: sql<number>`(select count(*) from ${issuedProfiles}
    join ${fits} on ${fits.id} = ${issuedProfiles.fitId}
    join ${scans} on ${scans.id} = ${fits.scanId} where ${scans.sampleId} = ${samples.id})`,
};
