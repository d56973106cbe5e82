import type { Handle } from '@/db/access/context';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { users } from '@/db/schema/users';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';
import { and, asc, eq, getTableColumns, sql, type SQL } from 'drizzle-orm';

/** Stopping sets of a team by name, without their profiles. */
export async function stoppingSetRows(
  db: Handle,
  teamId: string,
  where: SQL | undefined,
): Promise<(StoppingSetRow & { warnings: string[] })[]> {
  const {
    teamId: _teamId,
    createdById: _createdById,
    reading: _reading,
    ...columns
  } = getTableColumns(stoppingSets);
  const rows = await db
    .select({ ...columns, createdBy: users.name })
    .from(stoppingSets)
    .innerJoin(users, eq(users.id, stoppingSets.createdById))
    .where(and(eq(stoppingSets.teamId, teamId), where))
    .orderBy(asc(sql`lower(${stoppingSets.name})`), asc(stoppingSets.createdAt));
  return rows.map((row) => ({
    ...row,
    archivedAt: row.archivedAt?.toISOString() ?? null,
    createdAt: row.createdAt.toISOString(),
  }));
}
