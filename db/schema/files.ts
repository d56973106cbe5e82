import { blob, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { teams } from './teams';
import { users } from './users';

/** Files as they were uploaded, byte for byte. Rows are never changed. */
export const files = sqliteTable(
  'files',
  {
    id: idColumn(),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    name: text().notNull(),
    bytes: blob({ mode: 'buffer' }).notNull(),
    byteLength: integer().notNull(),
    sha256: text('sha256').notNull(),
    createdAt: momentColumn().notNull(),
    createdById: text()
      .notNull()
      .references(() => users.id),
  },
  (table) => [index('files_team').on(table.teamId)],
);
