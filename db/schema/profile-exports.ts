import { index, sqliteTable, text } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';
import { issuedProfiles } from './issued-profiles';
import { users } from './users';

/** Who took a profile out, when and on which grid. */
export const profileExports = sqliteTable(
  'profile_exports',
  {
    id: idColumn(),
    issuedProfileId: text()
      .notNull()
      .references(() => issuedProfiles.id),
    personId: text()
      .notNull()
      .references(() => users.id),
    at: momentColumn().notNull(),
    grid: text().notNull(),
  },
  (table) => [index('profile_exports_profile').on(table.issuedProfileId)],
);
