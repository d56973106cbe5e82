import type { Role } from '@/lib/schemas/common';
import { sql } from 'drizzle-orm';
import { check, index, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { momentColumn } from './columns';
import { teams } from './teams';
import { users } from './users';

export const memberships = sqliteTable(
  'memberships',
  {
    teamId: text()
      .notNull()
      .references(() => teams.id),
    userId: text()
      .notNull()
      .references(() => users.id),
    role: text().$type<Role>().notNull(),
    joinedAt: momentColumn().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.teamId, table.userId] }),
    index('memberships_user').on(table.userId),
    check('memberships_role', sql`${table.role} in ('owner', 'analyst', 'reviewer', 'modeller')`),
  ],
);
