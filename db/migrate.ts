import 'server-only';

import { migrate as applyMigrations } from 'drizzle-orm/libsql/migrator';
import { resolve } from 'node:path';

import type { Database } from './client';

/** Brings the database to the newest schema; does nothing when it is there already. */
export async function migrate(db: Database): Promise<void> {
  await applyMigrations(db, { migrationsFolder: resolve(process.cwd(), 'drizzle') });
}
