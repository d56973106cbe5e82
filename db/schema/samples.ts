import { sql } from 'drizzle-orm';
import { check, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { teams } from './teams';
import { users } from './users';

export const samples = sqliteTable(
  'samples',
  {
    id: idColumn(),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    name: text().notNull(),
    material: text().notNull(),
    carrier: text().$type<'electrons' | 'holes'>().notNull(),
    dopingPerCm3: real('doping_per_cm3'),
    dopingSigmaPerCm3: real('doping_sigma_per_cm3'),
    capMaterial: text().notNull(),
    capThicknessNm: real(),
    treatment: text().notNull(),
    notes: text().notNull(),
    invented: integer({ mode: 'boolean' }).notNull().default(false),
    archivedAt: momentColumn(),
    createdAt: momentColumn().notNull(),
    createdById: text()
      .notNull()
      .references(() => users.id),
  },
  (table) => [
    index('samples_team').on(table.teamId),
    check('samples_carrier', sql`${table.carrier} in ('electrons', 'holes')`),
  ],
);
