import { integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { files } from './files';
import { stoppingSets } from './stopping-sets';

/** The original files of a stopping set, in the order in which they were read. */
export const stoppingFiles = sqliteTable(
  'stopping_files',
  {
    stoppingSetId: text()
      .notNull()
      .references(() => stoppingSets.id),
    position: integer().notNull(),
    fileId: text()
      .notNull()
      .references(() => files.id),
  },
  (table) => [primaryKey({ columns: [table.stoppingSetId, table.position] })],
);
