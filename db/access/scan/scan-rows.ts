import type { Handle } from '@/db/access/context';
import { files } from '@/db/schema/files';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { users } from '@/db/schema/users';
import type { Scan } from '@/lib/schemas/scan';
import { and, asc, eq, getTableColumns, sql, type SQL } from 'drizzle-orm';

/** Scans of a team, by sample and name. */
export async function scanRows(
  db: Handle,
  teamId: string,
  where: SQL | undefined,
): Promise<Scan[]> {
  const {
    teamId: _teamId,
    createdById: _createdById,
    fileId: _fileId,
    reading: _reading,
    ...columns
  } = getTableColumns(scans);
  const { id, name, sha256, byteLength } = getTableColumns(files);
  const rows = await db
    .select({
      ...columns,
      sampleName: samples.name,
      createdBy: users.name,
      file: { id, name, sha256, byteLength },
    })
    .from(scans)
    .innerJoin(samples, eq(samples.id, scans.sampleId))
    .innerJoin(users, eq(users.id, scans.createdById))
    .leftJoin(files, eq(files.id, scans.fileId))
    .where(and(eq(scans.teamId, teamId), where))
    .orderBy(asc(sql`lower(${samples.name})`), asc(sql`lower(${scans.name})`));
  return rows.map((row) => ({
    ...row,
    archivedAt: row.archivedAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  }));
}
