import { acceptInvitation } from '@/db/access/person/accept-invitation';
import { signUp } from '@/db/access/person/sign-up';
import { invitePerson } from '@/db/access/team/invite-person';
import type { Context } from '@/db/access/context';
import type { Role } from '@/lib/schemas/common';

import type { TestDatabase } from './database';

export const PASSWORD = 'a long test password';

/** Someone who is signed in; every call of `context` is a request of its own. */
export interface TestPerson {
  email: string;
  sessionToken: string;
  context: () => Promise<Context>;
}

let count = 0;

/** A person with a team of their own. */
export async function personWithTeam(database: TestDatabase, name = 'Owner'): Promise<TestPerson> {
  const email = `person-${(count += 1)}@example.org`;
  const input = { name, email, password: PASSWORD, teamName: `Team of ${name}` };
  const { sessionToken } = await signUp(await database.context(), input);
  return { email, sessionToken, context: () => database.context(sessionToken) };
}

/** A new person in the team of an owner. */
export async function memberOf(
  database: TestDatabase,
  owner: TestPerson,
  role: Role,
): Promise<TestPerson> {
  const email = `person-${(count += 1)}@example.org`;
  const { path } = await invitePerson(await owner.context(), { email, role });
  const token = path.split('/').at(-1);
  const input = { token, name: `The ${role}`, password: PASSWORD };
  const { sessionToken } = await acceptInvitation(await database.context(), input);
  return { email, sessionToken, context: () => database.context(sessionToken) };
}

export interface TestTeam {
  owner: TestPerson;
  analyst: TestPerson;
  reviewer: TestPerson;
  modeller: TestPerson;
}

export async function testTeam(database: TestDatabase): Promise<TestTeam> {
  const owner = await personWithTeam(database);
  return {
    owner,
    analyst: await memberOf(database, owner, 'analyst'),
    reviewer: await memberOf(database, owner, 'reviewer'),
    modeller: await memberOf(database, owner, 'modeller'),
  };
}
