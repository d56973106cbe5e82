import { openDatabase, type OpenDatabase } from '@/db/client';
import { migrate } from '@/db/migrate';
import type { Context } from '@/db/access/context';
import { readSession } from '@/db/access/session';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { onTestFinished, afterAll } from 'vitest';

export interface TestDatabase extends OpenDatabase {
  url: string;
  /** A context as a request makes it: from the token in the cookie, or signed out. */
  context: (sessionToken?: string) => Promise<Context>;
}

/** A migrated database file of its own; gone when the test file, or with `forTest` the test, is done. */
export async function testDatabase({
  forTest = false,
  migrated = true,
} = {}): Promise<TestDatabase> {
  const folder = mkdtempSync(join(tmpdir(), 'strandline-test-'));
  const url = `file:${join(folder, 'test.db')}`;
  const opened = await openDatabase(url);
  const end = () => {
    opened.close();
    rmSync(folder, { recursive: true, force: true });
  };
  if (forTest) onTestFinished(end);
  else afterAll(end);
  if (migrated) await migrate(opened.db);
  return { ...opened, url, context: (token) => contextOn(opened, token) };
}

let client = 0;

export async function contextOn(
  { db, queue }: OpenDatabase,
  sessionToken?: string,
): Promise<Context> {
  const session = sessionToken === undefined ? null : await readSession(db, sessionToken);
  return {
    db,
    queue,
    viewer: session?.viewer ?? null,
    sessionId: session?.sessionId ?? null,
    now: new Date(),
    clientKey: `test client ${(client += 1)}`,
    device: 'A test',
  };
}

export function filePath({ url }: TestDatabase): string {
  return url.replace(/^file:/, '');
}
