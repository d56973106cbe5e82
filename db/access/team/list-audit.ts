import type { Context } from '@/db/access/context';
import { allow } from '@/db/access/policy';
import { auditLines } from '@/db/schema/audit-lines';
import { users } from '@/db/schema/users';
import type { AuditEntry } from '@/lib/schemas/team';
import { desc, eq } from 'drizzle-orm';

const MOST_LINES = 500;

/** What happened in the team, newest first. */
export async function listAudit(ctx: Context, _input: unknown): Promise<AuditEntry[]> {
  const viewer = allow(ctx, 'manage team');
  const rows = await ctx.db
    .select({
      position: auditLines.position,
      at: auditLines.at,
      person: users.name,
      verb: auditLines.verb,
      subject: auditLines.subject,
    })
    .from(auditLines)
    .innerJoin(users, eq(users.id, auditLines.personId))
    .where(eq(auditLines.teamId, viewer.teamId))
    .orderBy(desc(auditLines.position))
    .limit(MOST_LINES);
  return rows.map(({ position, at, ...rest }) => ({
    id: String(position),
    at: at.toISOString(),
    ...rest,
  }));
}
