import 'server-only';

import { sql } from 'drizzle-orm';
import { migrate as applyMigrations } from 'drizzle-orm/libsql/migrator';
import { readMigrationFiles } from 'drizzle-orm/migrator';
import { resolve } from 'node:path';

import type { Database } from './client';

const config = { migrationsFolder: resolve(process.cwd(), 'drizzle') };

/** Brings the database to the newest schema; does nothing when it is there already. */
export async function migrate(db: Database): Promise<void> {
  await applyMigrations(db, config);
}

/** How many migrations of this program the database has not had yet. */
export async function pendingMigrations(db: Database): Promise<number> {
  const applied = await db.all<{ created_at: number }>(
    sql`select created_at from __drizzle_migrations`,
  );
  const newest = Math.max(0, ...applied.map((row) => Number(row.created_at)));
  return readMigrationFiles(config).filter(({ folderMillis }) => folderMillis > newest).length;
}
