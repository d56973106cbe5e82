import 'server-only';

import { luciaOn } from '@/db/access/lucia';
import { database } from '@/db/client';
import { migrate } from '@/db/migrate';
import { log } from '@/lib/log';

/** A server without its schema would answer every request with an error: it ends instead. */
export async function prepareDatabase(): Promise<void> {
  try {
    const { db } = await database();
    await migrate(db);
    await luciaOn(db).deleteExpiredSessions();
    log.info('The database is ready.');
  } catch (error) {
    log.fatal({ err: error }, 'The database could not be prepared.');
    process.exit(1);
  }
}
