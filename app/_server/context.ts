import 'server-only';

import type { Context } from '@/db/access/context';
import { readSession } from '@/db/access/session';
import { database } from '@/db/client';
import { headers } from 'next/headers';
import { cache } from 'react';

import { deviceName } from './device-name';
import { readSessionToken } from './session-cookie';

/** Who asks now. Within one render the session is read once. */
export const requestContext = cache(async (): Promise<Context> => {
  const { db, queue } = await database();
  const token = await readSessionToken();
  const session = token === null || token === '' ? null : await readSession(db, token);
  const sent = await headers();
  return {
    db,
    queue,
    viewer: session?.viewer ?? null,
    sessionId: session?.sessionId ?? null,
    now: new Date(),
    clientKey: sent.get('x-forwarded-for')?.split(',')[0]?.trim() ?? 'unknown',
    device: deviceName(sent.get('user-agent') ?? ''),
  };
});
