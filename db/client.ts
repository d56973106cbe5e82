import 'server-only';

import { env } from '@/lib/env';
import { log } from '@/lib/log';
import { createClient } from '@libsql/client';
import { sql } from 'drizzle-orm';
import { drizzle } from 'drizzle-orm/libsql';
import { mkdirSync } from 'node:fs';
import { dirname } from 'node:path';

import { queuedClient } from './queued-client';
import { WriteQueue } from './write-queue';

/** How long a statement waits for another process to let go of the file. */
const BUSY_TIMEOUT_MS = 10_000;

export interface OpenDatabase {
  db: Database;
  queue: WriteQueue;
  close: () => void;
}
export type Database = ReturnType<typeof connect>['db'];

/** Opens a database file (its folder is made) or a libSQL server. */
export async function openDatabase(url: string, authToken?: string): Promise<OpenDatabase> {
  if (url.startsWith('file:')) mkdirSync(dirname(filePath(url)), { recursive: true });
  const opened = connect(url, authToken);
  if (url.startsWith('file:')) await opened.db.run(sql`pragma journal_mode = wal`);
  await assertForeignKeys(opened.db);
  return opened;
}

/** The database of this process. It survives hot reloading, which would open a second writer. */
export function database(): Promise<OpenDatabase> {
  const holder = globalThis as typeof globalThis & { strandlineDatabase?: Promise<OpenDatabase> };
  holder.strandlineDatabase ??= openDatabase(env.DATABASE_URL, env.DATABASE_AUTH_TOKEN);
  return holder.strandlineDatabase;
}

function connect(url: string, authToken?: string) {
  const queue = new WriteQueue();
  const client = createClient({ url, authToken, timeout: BUSY_TIMEOUT_MS });
  const db = drizzle({ client: queuedClient(client, queue, endOnBusy), casing: 'snake_case' });
  return { db, queue, close: () => client.close() };
}

async function assertForeignKeys(db: Database): Promise<void> {
  const row = await db.get<{ foreign_keys: number }>(sql`pragma foreign_keys`);
  if (row.foreign_keys !== 1) throw new Error('The database does not enforce foreign keys.');
}

/**
 * After SQLITE_BUSY the local driver answers "ok" to inserts that it never commits. A process that
 * has seen it must not go on.
 */
function endOnBusy(error: unknown): void {
  if (!isBusy(error)) return;
  log.fatal({ err: error }, 'The database file was busy; ending before anything is lost.');
  process.exit(1);
}

function isBusy(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  const code = 'code' in error && typeof error.code === 'string' ? error.code : '';
  return code.startsWith('SQLITE_BUSY') || isBusy(error.cause);
}

function filePath(url: string): string {
  return url.replace(/^file:(\/\/)?/, '').replace(/\?.*$/, '');
}
