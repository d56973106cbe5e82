import { sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';

import { idColumn, momentColumn } from './columns';

export const users = sqliteTable(
  'users',
  {
    id: idColumn(),
    /** Trimmed and in lower case. */
    email: text().notNull(),
    name: text().notNull(),
    /** argon2id, with its parameters and salt inside. */
    passwordHash: text().notNull(),
    createdAt: momentColumn().notNull(),
  },
  (table) => [uniqueIndex('users_email').on(table.email)],
);
