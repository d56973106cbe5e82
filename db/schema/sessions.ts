import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { momentColumn } from './columns';
import { teams } from './teams';
import { users } from './users';

export const sessions = sqliteTable(
  'sessions',
  {
    /** SHA-256 of the token in the cookie: a copy of this table signs nobody in. */
    id: text().primaryKey(),
    userId: text()
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    /** Seconds since 1970, as Lucia's adapter wants it. */
    expiresAt: integer().notNull(),
    createdAt: momentColumn().notNull(),
    device: text().notNull(),
    /** The team that the person works in now. */
    teamId: text().references(() => teams.id),
  },
  (table) => [index('sessions_user').on(table.userId)],
);
