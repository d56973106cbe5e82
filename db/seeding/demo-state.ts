import type { Database } from '@/db/client';
import type { DemoData } from '@/db/demo/types';
import { auditLines } from '@/db/schema/audit-lines';
import { files } from '@/db/schema/files';
import { fits } from '@/db/schema/fits';
import { invitations } from '@/db/schema/invitations';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { memberships } from '@/db/schema/memberships';
import { reviewEvents } from '@/db/schema/review-events';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { stoppingFiles } from '@/db/schema/stopping-files';
import { stoppingProfiles } from '@/db/schema/stopping-profiles';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { teams } from '@/db/schema/teams';
import { users } from '@/db/schema/users';
import { desc, eq, inArray } from 'drizzle-orm';

export type DemoState = 'absent' | 'unfinished' | 'finished';

/** The team is marked as invented in the last step of seeding, so that an interrupted one is known. */
export async function demoState(db: Database, demo: DemoData): Promise<DemoState> {
  const [team] = await demoTeam(db, demo);
  if (team === undefined) return 'absent';
  return team.invented ? 'finished' : 'unfinished';
}

/** Takes away what an interrupted seeding left behind, children before parents. */
export async function removeUnfinished(db: Database, demo: DemoData): Promise<void> {
  const [team] = await demoTeam(db, demo);
  if (team === undefined || team.invented) return;
  await db.transaction(async (tx) => {
    const teamFits = tx.select({ id: fits.id }).from(fits).where(eq(fits.teamId, team.id));
    const sets = tx
      .select({ id: stoppingSets.id })
      .from(stoppingSets)
      .where(eq(stoppingSets.teamId, team.id));
    await tx.delete(issuedProfiles).where(eq(issuedProfiles.teamId, team.id));
    await tx.delete(reviewEvents).where(inArray(reviewEvents.fitId, teamFits));
    // A revision goes before the fit that it came from.
    for (const { id } of await teamFits.orderBy(desc(fits.createdAt)))
      await tx.delete(fits).where(eq(fits.id, id));
    await tx.delete(stoppingProfiles).where(inArray(stoppingProfiles.stoppingSetId, sets));
    await tx.delete(stoppingFiles).where(inArray(stoppingFiles.stoppingSetId, sets));
    for (const table of [stoppingSets, scans, samples, files, invitations, auditLines, memberships])
      await tx.delete(table).where(eq(table.teamId, team.id));
    await tx.delete(users).where(inArray(users.email, emailsOf(demo)));
    await tx.delete(teams).where(eq(teams.id, team.id));
  });
}

function demoTeam(db: Database, demo: DemoData) {
  return db
    .selectDistinct({ id: teams.id, invented: teams.invented })
    .from(teams)
    .innerJoin(memberships, eq(memberships.teamId, teams.id))
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(inArray(users.email, emailsOf(demo)));
}

const emailsOf = (demo: DemoData) => demo.people.map(({ email }) => email);
