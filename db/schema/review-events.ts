import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { momentColumn } from './columns';
import { fits } from './fits';
import { users } from './users';

/** The history of a fit. Rows are added and never changed. */
export const reviewEvents = sqliteTable(
  'review_events',
  {
    /** Keeps the order of events within one millisecond. */
    position: integer().primaryKey({ autoIncrement: true }),
    id: text().notNull().unique(),
    fitId: text()
      .notNull()
      .references(() => fits.id, { onDelete: 'cascade' }),
    kind: text().$type<'submitted' | 'accepted' | 'returned' | 'comment'>().notNull(),
    body: text().notNull(),
    target: text().notNull(),
    personId: text()
      .notNull()
      .references(() => users.id),
    at: momentColumn().notNull(),
  },
  (table) => [
    index('review_events_fit').on(table.fitId),
    check(
      'review_events_kind',
      sql`${table.kind} in ('submitted', 'accepted', 'returned', 'comment')`,
    ),
  ],
);
