import { integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { fits } from './fits';
import { teams } from './teams';
import { users } from './users';

/** An accepted fit under its number. Rows are never changed. */
export const issuedProfiles = sqliteTable(
  'issued_profiles',
  {
    id: idColumn(),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    fitId: text()
      .notNull()
      .references(() => fits.id),
    year: integer().notNull(),
    sequence: integer().notNull(),
    /** SL-2026-014 */
    number: text().notNull(),
    issuedAt: momentColumn().notNull(),
    issuedById: text()
      .notNull()
      .references(() => users.id),
  },
  (table) => [
    uniqueIndex('issued_profiles_number').on(table.teamId, table.year, table.sequence),
    uniqueIndex('issued_profiles_fit').on(table.fitId),
  ],
);
