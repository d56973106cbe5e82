import type { Context } from '@/db/access/context';
import type { Database } from '@/db/client';
import type { WriteQueue } from '@/db/write-queue';

export interface Store {
  db: Database;
  queue: WriteQueue;
}
/** A request by a person of the demo, some time after the one before it. */
export type As = (personKey: string) => Context;
/** Ids of what was made, by the key in the demo data. */
export type Ids = Record<string, string>;
