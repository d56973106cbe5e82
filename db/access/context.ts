import type { Database } from '@/db/client';
import type { WriteQueue } from '@/db/write-queue';
import type { Viewer } from '@/lib/schemas/person';
import type { ResultSet } from '@libsql/client';
import type { BaseSQLiteDatabase } from 'drizzle-orm/sqlite-core';

/** The database or a transaction on it: what reads and writes rows. */
export type Handle = BaseSQLiteDatabase<'async', ResultSet, Record<string, never>>;

/** Who asks, when, and with which database: the first argument of every verb. */
export interface Context {
  db: Database;
  queue: WriteQueue;
  /** Null when signed out. */
  viewer: Viewer | null;
  sessionId: string | null;
  now: Date;
  /** Where the request comes from, for limiting how often. */
  clientKey: string;
  /** What the browser calls itself, for the list of sessions. */
  device: string;
}

/** `(ctx, input) => answer`: the unit of the server. */
export type Verb<Answer> = (ctx: Context, input: unknown) => Promise<Answer>;
