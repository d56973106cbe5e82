import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { momentColumn } from './columns';
import { teams } from './teams';
import { users } from './users';

/** Who did what in a team. Rows are added and never changed. */
export const auditLines = sqliteTable(
  'audit_lines',
  {
    position: integer().primaryKey({ autoIncrement: true }),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    personId: text()
      .notNull()
      .references(() => users.id),
    at: momentColumn().notNull(),
    /** The verb, such as "accept-fit". */
    verb: text().notNull(),
    subject: text().notNull(),
  },
  (table) => [index('audit_lines_team').on(table.teamId, table.at)],
);
