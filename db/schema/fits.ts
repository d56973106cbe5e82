import type {
  CarrierProfile,
  Check,
  FitAnswer,
  FitParameter,
  ScanPoint,
} from '@/lib/inversion/types';
import type { FitSpec } from '@/lib/schemas/fit';
import { sql } from 'drizzle-orm';
import {
  check,
  index,
  integer,
  real,
  sqliteTable,
  text,
  type AnySQLiteColumn,
} from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { scans } from './scans';
import { stoppingSets } from './stopping-sets';
import { teams } from './teams';
import { users } from './users';

export type FitState = 'draft' | 'submitted' | 'accepted' | 'returned';

/** A frozen fit. After the insert only `state` changes. */
export const fits = sqliteTable(
  'fits',
  {
    id: idColumn(),
    teamId: text()
      .notNull()
      .references(() => teams.id),
    scanId: text()
      .notNull()
      .references(() => scans.id),
    stoppingSetId: text()
      .notNull()
      .references(() => stoppingSets.id),
    parentFitId: text().references((): AnySQLiteColumn => fits.id),
    name: text().notNull(),
    notes: text().notNull(),
    state: text().$type<FitState>().notNull(),
    observable: text().$type<'fraction' | 'rate'>().notNull(),
    profile: text().$type<'sharp' | 'graded'>().notNull(),
    spec: text({ mode: 'json' }).$type<FitSpec>().notNull(),
    /** The points as fitted: those switched off stay, marked. */
    points: text({ mode: 'json' }).$type<ScanPoint[]>().notNull(),
    answer: text({ mode: 'json' }).$type<FitAnswer>().notNull(),
    carrierProfile: text({ mode: 'json' }).$type<CarrierProfile>().notNull(),
    checks: text({ mode: 'json' }).$type<Check[]>().notNull(),
    /** Out of `answer`, so that a list need not read it. */
    edge: text({ mode: 'json' }).$type<FitParameter>(),
    width: text({ mode: 'json' }).$type<FitParameter>(),
    chiSquare: real().notNull(),
    degreesOfFreedom: integer().notNull(),
    aicc: real(),
    /** Of the scan when the fit was frozen: tells whether the scan was edited since. */
    scanPointsSha256: text('scan_points_sha256').notNull(),
    pointsSha256: text('points_sha256').notNull(),
    stoppingSetSha256: text('stopping_set_sha256').notNull(),
    inputsSha256: text('inputs_sha256').notNull(),
    createdAt: momentColumn().notNull(),
    createdById: text()
      .notNull()
      .references(() => users.id),
    submittedAt: momentColumn(),
  },
  (table) => [
    index('fits_team_state').on(table.teamId, table.state),
    index('fits_scan').on(table.scanId),
    index('fits_parent').on(table.parentFitId),
    check('fits_state', sql`${table.state} in ('draft', 'submitted', 'accepted', 'returned')`),
  ],
);
