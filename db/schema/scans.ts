import type { ScanReading, TypedPoint } from '@/lib/schemas/scan';
import { sql } from 'drizzle-orm';
import { check, index, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { files } from './files';
import { samples } from './samples';
import { teams } from './teams';
import { users } from './users';

export const scans = sqliteTable(
  'scans',
  {
    id: idColumn(),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    sampleId: text()
      .notNull()
      .references(() => samples.id),
    name: text().notNull(),
    observable: text().$type<'fraction' | 'rate'>().notNull(),
    temperatureK: real(),
    fieldMT: real(),
    illumination: text().$type<'dark' | 'illuminated' | 'after illumination'>().notNull(),
    measuredOn: text().notNull(),
    notes: text().notNull(),
    points: text({ mode: 'json' }).$type<TypedPoint[]>().notNull(),
    pointsSha256: text('points_sha256').notNull(),
    asymmetryScaleError: real(),
    fileId: text().references(() => files.id),
    /** How the file was read: with it the points follow from the bytes again. */
    reading: text({ mode: 'json' }).$type<ScanReading>(),
    invented: integer({ mode: 'boolean' }).notNull().default(false),
    archivedAt: momentColumn(),
    createdAt: momentColumn().notNull(),
    createdById: text()
      .notNull()
      .references(() => users.id),
  },
  (table) => [
    index('scans_team').on(table.teamId),
    index('scans_sample').on(table.sampleId),
    check('scans_observable', sql`${table.observable} in ('fraction', 'rate')`),
    check(
      'scans_illumination',
      sql`${table.illumination} in ('dark', 'illuminated', 'after illumination')`,
    ),
  ],
);
