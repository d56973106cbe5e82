import 'server-only';

import { database } from '@/db/client';
import { pendingMigrations } from '@/db/migrate';
import { log } from '@/lib/log';

export async function readiness(): Promise<Response> {
  const headers = { 'cache-control': 'no-store' };
  try {
    const { db } = await database();
    const pending = await pendingMigrations(db);
    const body = { status: pending === 0 ? 'ready' : 'waiting', pendingMigrations: pending };
    return Response.json(body, { status: pending === 0 ? 200 : 503, headers });
  } catch (error) {
    log.error({ err: error }, 'The database does not answer.');
    return Response.json({ status: 'database does not answer' }, { status: 503, headers });
  }
}
