import { integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';

export const teams = sqliteTable('teams', {
  id: idColumn(),
  name: text().notNull(),
  /** Seeded from the demo generator. */
  invented: integer({ mode: 'boolean' }).notNull().default(false),
  createdAt: momentColumn().notNull(),
});
