import 'server-only';

import { luciaOn } from '@/db/access/lucia';
import type { StartedSession } from '@/db/access/session';
import { database } from '@/db/client';
import { env } from '@/lib/env';
import { cookies, headers } from 'next/headers';

/** The token in the cookie of this request. */
export async function readSessionToken(): Promise<string | null> {
  const { db } = await database();
  return (await cookies()).get(luciaOn(db).sessionCookieName)?.value ?? null;
}

export async function setSessionCookie(session: StartedSession): Promise<void> {
  const { db } = await database();
  const cookie = luciaOn(db).createSessionCookie(session.sessionToken);
  const secure = await reachedOverHttps();
  (await cookies()).set(cookie.name, cookie.value, { ...cookie.attributes, secure });
}

export async function clearSessionCookie(): Promise<void> {
  const { db } = await database();
  const cookie = luciaOn(db).createBlankSessionCookie();
  const secure = await reachedOverHttps();
  (await cookies()).set(cookie.name, cookie.value, { ...cookie.attributes, secure });
}

/** A browser on plain http drops a Secure cookie, and a first look at the product is on plain http. */
async function reachedOverHttps(): Promise<boolean> {
  if (env.STRANDLINE_ORIGIN !== undefined) return env.STRANDLINE_ORIGIN.startsWith('https:');
  const protocol = (await headers()).get('x-forwarded-proto') ?? 'http';
  return protocol.split(',')[0]?.trim() === 'https';
}
