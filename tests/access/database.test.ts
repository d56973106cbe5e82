import { transaction } from '@/db/access/transaction';
import { createSample } from '@/db/access/sample/create-sample';
import { listSamples } from '@/db/access/sample/list-samples';
import { auditLines } from '@/db/schema/audit-lines';
import { samples } from '@/db/schema/samples';
import { teams } from '@/db/schema/teams';
import { sql } from 'drizzle-orm';
import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import { beforeAll, describe, expect, it } from 'vitest';

import { SAMPLE } from '../support/data';
import { testDatabase } from '../support/database';
import { personWithTeam, type TestPerson } from '../support/people';

const run = promisify(execFile);

describe('the database', async () => {
  const database = await testDatabase();
  let owner: TestPerson;
  beforeAll(async () => {
    owner = await personWithTeam(database);
  });

  it('keeps a write-ahead log and enforces foreign keys on every connection', async () => {
    const [mode] = await database.db.all<{ journal_mode: string }>(sql`pragma journal_mode`);
    expect(mode?.journal_mode).toBe('wal');
    const keys = await Promise.all(
      Array.from({ length: 8 }, () =>
        database.db.get<{ foreign_keys: number }>(sql`pragma foreign_keys`),
      ),
    );
    expect(keys.every((row) => row.foreign_keys === 1)).toBe(true);
    const orphan = { teamId: 'none', personId: 'none', at: new Date(), verb: 'x', subject: 'x' };
    await expect(database.db.insert(auditLines).values(orphan)).rejects.toMatchObject({
      cause: { extendedCode: 'SQLITE_CONSTRAINT_FOREIGNKEY' },
    });
  });

  it('refuses a write past the handle of a transaction instead of waiting for ever', async () => {
    const ctx = await owner.context();
    const attempt = transaction(ctx, async () => {
      await ctx.db.insert(teams).values({ id: 'past', name: 'Past', createdAt: ctx.now });
    });
    await expect(attempt).rejects.toThrow();
    await expect(transaction(ctx, () => transaction(ctx, async () => 'nested'))).rejects.toThrow(
      /handle of that transaction/,
    );
    // The queue goes on afterwards.
    await createSample(await owner.context(), SAMPLE);
  });

  it('leaves nothing of a transaction that fails', async () => {
    const ctx = await owner.context();
    const attempt = transaction(ctx, async (tx) => {
      await tx.insert(teams).values({ id: 'half', name: 'Half', createdAt: ctx.now });
      throw new Error('planned');
    });
    await expect(attempt).rejects.toThrow('planned');
    expect(await database.db.$count(teams, sql`id = 'half'`)).toBe(0);
  });

  it('keeps every row of many writers at once in one process', async () => {
    const before = (await listSamples(await owner.context(), {})).length;
    const writes = Array.from({ length: 120 }, async (_, index) => {
      const input = { ...SAMPLE, name: index % 3 === 0 ? '' : `Wafer ${index}` };
      return createSample(await owner.context(), input);
    });
    const done = (await Promise.allSettled(writes)).filter(({ status }) => status === 'fulfilled');
    expect(done).toHaveLength(80);
    expect(await listSamples(await owner.context(), {})).toHaveLength(before + done.length);
  });

  it('keeps every row that three processes were told is written, and no other', async () => {
    const { viewer } = await owner.context();
    const before = await database.db.$count(samples);
    const writer = () =>
      run(
        process.execPath,
        [
          '--conditions=react-server',
          '--import',
          'tsx',
          'tests/support/write-many.ts',
          viewer?.teamId ?? '',
          viewer?.userId ?? '',
          '25',
        ],
        { env: { ...process.env, DATABASE_URL: database.url, NODE_ENV: 'test' } },
      );
    const outputs = await Promise.all([writer(), writer(), writer()]);
    const told = outputs.flatMap(({ stdout }) => JSON.parse(stdout) as string[]);
    expect(told).toHaveLength(3 * 25 * 3);
    const names = new Set((await database.db.select().from(samples)).map(({ id }) => id));
    expect(told.filter((id) => !names.has(id))).toEqual([]);
    expect(names.size).toBe(before + told.length);
  }, 120_000);
});
