import { migrate, pendingMigrations } from '@/db/migrate';
import { listFits } from '@/db/access/fit/list-fits';
import { readFit } from '@/db/access/fit/read-fit';
import { commentFit } from '@/db/access/review/comment-fit';
import { sql } from 'drizzle-orm';
import { migrate as applyMigrations } from 'drizzle-orm/libsql/migrator';
import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it, onTestFinished } from 'vitest';

import { savedFit, testData } from '../support/data';
import { testDatabase } from '../support/database';
import { testTeam } from '../support/people';

describe('migrations', () => {
  it('bring an empty database to the schema, and say how many are missing', async () => {
    const { db } = await testDatabase({ forTest: true, migrated: false });
    await expect(pendingMigrations(db)).rejects.toThrow();
    await migrate(db);
    expect(await pendingMigrations(db)).toBe(0);
    await db.run(sql`delete from __drizzle_migrations`);
    expect(await pendingMigrations(db)).toBeGreaterThan(0);
  });

  it('make what the table definitions in the sources say', async () => {
    const { db } = await testDatabase({ forTest: true });
    const rows = await db.all<{ name: string }>(
      sql`select name from sqlite_master where type = 'table' and name not like '\\_\\_%' escape '\\'
          and name not like 'sqlite\\_%' escape '\\'`,
    );
    const snapshot = JSON.parse(readFileSync(newestSnapshot(), 'utf8')) as { tables: object };
    expect(rows.map(({ name }) => name).sort()).toEqual(Object.keys(snapshot.tables).sort());
  });

  it('leave a database in use as it was when there is nothing new', async () => {
    const database = await testDatabase({ forTest: true });
    const { fit, team } = await populated(database);
    await migrate(database.db);
    expect(await readFit(await team.analyst.context(), { id: fit.id })).toEqual(fit);
  });

  /**
   * SQLite changes a table by making a new one and dropping the old. With foreign keys on, the drop
   * would take the children with it: the comments of every fit, here.
   */
  it('rebuild a populated table without losing its children', async () => {
    const database = await testDatabase({ forTest: true });
    const { fit, team } = await populated(database);
    const [{ sql: definition } = { sql: '' }] = await database.db.all<{ sql: string }>(
      sql`select sql from sqlite_master where name = 'fits'`,
    );
    const rebuild = [
      'PRAGMA foreign_keys=OFF;',
      definition
        .replace(/CREATE TABLE [`"]?fits[`"]?/, 'CREATE TABLE `__new_fits`')
        .replaceAll(/[`"]fits[`"]\./g, '`__new_fits`.') + ';',
      'INSERT INTO `__new_fits` SELECT * FROM `fits`;',
      'DROP TABLE `fits`;',
      'ALTER TABLE `__new_fits` RENAME TO `fits`;',
      'PRAGMA foreign_keys=ON;',
      'ALTER TABLE `fits` ADD `later` text;',
    ];
    await applyMigrations(database.db, { migrationsFolder: folderWith(rebuild) });
    expect(await readFit(await team.analyst.context(), { id: fit.id })).toEqual(fit);
    expect(await listFits(await team.analyst.context(), {})).toHaveLength(2);
    expect(await database.db.all(sql`pragma foreign_key_check`)).toEqual([]);
    expect(await database.db.all(sql`select later from fits`)).toHaveLength(2);
  });
});

async function populated(database: Awaited<ReturnType<typeof testDatabase>>) {
  const team = await testTeam(database);
  const data = await testData(team.analyst);
  const id = await savedFit(team.analyst, data, { resamples: 10 });
  await savedFit(team.analyst, data, { resamples: 10, profile: 'sharp' });
  await commentFit(await team.reviewer.context(), { id, body: 'Keep me.' });
  const fit = await readFit(await team.analyst.context(), { id });
  expect(fit.events).toHaveLength(1);
  return { team, fit };
}

const JOURNAL = 'meta/_journal.json';
interface Journal {
  entries: { idx: number; when: number; tag: string; version: string; breakpoints: boolean }[];
}

/** A copy of the migrations with one more at the end. */
function folderWith(statements: readonly string[]): string {
  const folder = mkdtempSync(join(tmpdir(), 'strandline-migrations-'));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  cpSync('drizzle', folder, { recursive: true });
  const journal = JSON.parse(readFileSync(join(folder, JOURNAL), 'utf8')) as Journal;
  const last = journal.entries.at(-1);
  if (last === undefined) throw new Error('There are no migrations.');
  const next = { ...last, idx: last.idx + 1, when: last.when + 1, tag: '9999_next' };
  journal.entries.push(next);
  writeFileSync(join(folder, JOURNAL), JSON.stringify(journal));
  writeFileSync(join(folder, '9999_next.sql'), statements.join('\n--> statement-breakpoint\n'));
  return folder;
}

function newestSnapshot(): string {
  const journal = JSON.parse(readFileSync(join('drizzle', JOURNAL), 'utf8')) as Journal;
  const idx = journal.entries.at(-1)?.idx ?? 0;
  return join('drizzle', 'meta', `${String(idx).padStart(4, '0')}_snapshot.json`);
}
