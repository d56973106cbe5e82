import { blob, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { stoppingSets } from './stopping-sets';

/** One row per energy; edges and masses are little-endian 64-bit floats, so nothing is rounded. */
export const stoppingProfiles = sqliteTable(
  'stopping_profiles',
  {
    stoppingSetId: text()
      .notNull()
      .references(() => stoppingSets.id),
    energyKeV: real('energy_kev').notNull(),
    edgesNm: blob({ mode: 'buffer' }).notNull(),
    mass: blob({ mode: 'buffer' }).notNull(),
    lostShare: real(),
  },
  (table) => [primaryKey({ columns: [table.stoppingSetId, table.energyKeV] })],
);
