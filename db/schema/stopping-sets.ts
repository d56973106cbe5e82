import type { StoppingReading } from '@/lib/schemas/stopping-set';
import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { teams } from './teams';
import { users } from './users';

/** Only name, layer stack, origin and notes are ever edited: fits lean on the profiles. */
export const stoppingSets = sqliteTable(
  'stopping_sets',
  {
    id: idColumn(),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    name: text().notNull(),
    layerStack: text().notNull(),
    origin: text().notNull(),
    notes: text().notNull(),
    energiesKeV: text('energies_kev', { mode: 'json' }).$type<number[]>().notNull(),
    /** The largest number of bins in one profile. */
    bins: integer().notNull(),
    warnings: text({ mode: 'json' }).$type<string[]>().notNull(),
    reading: text({ mode: 'json' }).$type<StoppingReading>().notNull(),
    sha256: text('sha256').notNull(),
    invented: integer({ mode: 'boolean' }).notNull().default(false),
    archivedAt: momentColumn(),
    createdAt: momentColumn().notNull(),
    createdById: text()
      .notNull()
      .references(() => users.id),
  },
  (table) => [index('stopping_sets_team').on(table.teamId)],
);
