import type { Context } from '@/db/access/context';
import { allow, mayAct } from '@/db/access/policy';
import { invitations } from '@/db/schema/invitations';
import { memberships } from '@/db/schema/memberships';
import { users } from '@/db/schema/users';
import type { Team } from '@/lib/schemas/team';
import { and, asc, eq, gt, isNull } from 'drizzle-orm';

/** The people of the team, and for owners its open invitations. */
export async function readTeam(ctx: Context, _input: unknown): Promise<Team> {
  const viewer = allow(ctx, 'read');
  const people = await ctx.db
    .select({
      userId: users.id,
      name: users.name,
      email: users.email,
      role: memberships.role,
      joinedAt: memberships.joinedAt,
    })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(memberships.teamId, viewer.teamId))
    .orderBy(asc(memberships.joinedAt), asc(users.name));
  return {
    id: viewer.teamId,
    name: viewer.teamName,
    people: people.map((person) => ({ ...person, joinedAt: person.joinedAt.toISOString() })),
    invitations: mayAct(viewer, 'manage team') ? await openInvitations(ctx, viewer.teamId) : [],
  };
}

async function openInvitations(ctx: Context, teamId: string): Promise<Team['invitations']> {
  const rows = await ctx.db
    .select({
      id: invitations.id,
      email: invitations.email,
      role: invitations.role,
      expiresAt: invitations.expiresAt,
    })
    .from(invitations)
    .where(
      and(
        eq(invitations.teamId, teamId),
        isNull(invitations.acceptedAt),
        isNull(invitations.cancelledAt),
        gt(invitations.expiresAt, ctx.now),
      ),
    )
    .orderBy(asc(invitations.createdAt));
  return rows.map((row) => ({ ...row, expiresAt: row.expiresAt.toISOString() }));
}
