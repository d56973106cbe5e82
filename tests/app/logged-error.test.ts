import { loggedError } from '@/lib/logged-error';
import { DrizzleQueryError } from 'drizzle-orm/errors';
import { expect, it } from 'vitest';

it('logs a failed query with its causes and without the data in it', () => {
  const cause = new Error('no such table: users');
  const query = 'insert into users values (?, ?)';
  const failed = new DrizzleQueryError(query, ['a secret hash', 'secret\nparams: secret'], cause);
  for (const error of [failed, new Error('While signing up', { cause: failed })]) {
    const line = JSON.stringify(loggedError(error));
    expect(line).toContain('no such table: users');
    expect(line).toContain(query);
    expect(line).not.toContain('secret');
  }
});
