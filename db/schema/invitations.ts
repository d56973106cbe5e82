import type { Role } from '@/lib/schemas/common';
import { sql } from 'drizzle-orm';
import { check, index, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { teams } from './teams';
import { users } from './users';

export const invitations = sqliteTable(
  'invitations',
  {
    id: idColumn(),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    email: text().notNull(),
    role: text().$type<Role>().notNull(),
    tokenSha256: text().notNull(),
    createdById: text()
      .notNull()
      .references(() => users.id),
    createdAt: momentColumn().notNull(),
    expiresAt: momentColumn().notNull(),
    acceptedAt: momentColumn(),
    cancelledAt: momentColumn(),
  },
  (table) => [
    uniqueIndex('invitations_token').on(table.tokenSha256),
    index('invitations_team').on(table.teamId),
    check('invitations_role', sql`${table.role} in ('owner', 'analyst', 'reviewer', 'modeller')`),
  ],
);
