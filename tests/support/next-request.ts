import { vi } from 'vitest';

import type { TestDatabase } from './database';

/**
 * What next/headers, next/cache and next/navigation are to a server under test: one request at a
 * time, with the headers and cookies that the test gives it.
 */
interface CookieSet {
  name: string;
  value: string;
  options: Record<string, unknown>;
}

const request = {
  headers: new Headers(),
  cookies: new Map<string, string>(),
  set: [] as CookieSet[],
  revalidated: [] as string[],
};

export class Redirected extends Error {
  constructor(readonly to: string) {
    super(`redirect to ${to}`);
  }
}
export class NotFound extends Error {}

export const SESSION_COOKIE = 'strandline_session';

/** The next call comes with this session and these headers. */
export function arrive(sessionToken?: string, headers: Record<string, string> = {}): void {
  request.headers = new Headers(headers);
  request.cookies = new Map(sessionToken === undefined ? [] : [[SESSION_COOKIE, sessionToken]]);
  request.set = [];
  request.revalidated = [];
}

export const cookiesSet = () => request.set;
export const revalidated = () => request.revalidated;

/** The database of the process, for adapters that look it up themselves. */
export function serveFrom({ db, queue, close }: TestDatabase): void {
  Object.assign(globalThis, { strandlineDatabase: Promise.resolve({ db, queue, close }) });
}

export const nextHeaders = {
  headers: async () => request.headers,
  cookies: async () => ({
    get: (name: string) => {
      const value = request.cookies.get(name);
      return value === undefined ? undefined : { name, value };
    },
    set: (name: string, value: string, options: Record<string, unknown>) => {
      request.set.push({ name, value, options });
    },
  }),
};
export const nextCache = {
  revalidatePath: vi.fn((path: string) => {
    request.revalidated.push(path);
  }),
};
export const nextNavigation = {
  redirect: (to: string) => {
    throw new Redirected(to);
  },
  notFound: () => {
    throw new NotFound('not found');
  },
};
