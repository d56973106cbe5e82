import type { Handle } from '@/db/access/context';
import { memberships } from '@/db/schema/memberships';
import { users } from '@/db/schema/users';
import { AppError } from '@/lib/errors';
import type { Role } from '@/lib/schemas/common';
import { and, count, eq } from 'drizzle-orm';

export interface Member {
  name: string;
  role: Role;
}

/** A person of the team, or a refusal. */
export async function memberOf(tx: Handle, teamId: string, userId: string): Promise<Member> {
  const [member] = await tx
    .select({ name: users.name, role: memberships.role })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.teamId, teamId), eq(memberships.userId, userId)));
  if (member === undefined) throw new AppError('not_found', 'This person is not in the team.');
  return member;
}

/** A team without an owner could never be managed again. */
export async function refuseLastOwner(tx: Handle, teamId: string, member: Member): Promise<void> {
  if (member.role !== 'owner') return;
  const [owners] = await tx
    .select({ count: count() })
    .from(memberships)
    .where(and(eq(memberships.teamId, teamId), eq(memberships.role, 'owner')));
  if ((owners?.count ?? 0) < 2)
    throw new AppError('conflict', 'A team needs an owner: make someone else an owner first.');
}
