/**
 * One of several processes on one database file: writes samples, singly and in transactions, half
 * of which fail at their end. Prints what it was told has been written.
 */
import { database } from '@/db/client';
import { audit } from '@/db/access/audit';
import { samples } from '@/db/schema/samples';
import { randomUUID } from 'node:crypto';

const [teamId = '', userId = '', rounds = '0'] = process.argv.slice(2);
const { db, queue, close } = await database();
const written: string[] = [];

const row = (id: string) => ({
  id,
  teamId,
  name: id,
  material: 'Si',
  carrier: 'holes' as const,
  capMaterial: '',
  treatment: '',
  notes: 'x'.repeat(2000),
  createdAt: new Date(),
  createdById: userId,
});

async function alone(): Promise<void> {
  const id = randomUUID();
  await db.insert(samples).values(row(id));
  written.push(id);
}

async function inTransaction(fails: boolean): Promise<void> {
  const ids = [randomUUID(), randomUUID()];
  try {
    await db.transaction((tx) =>
      queue.markInside(async () => {
        for (const id of ids) await tx.insert(samples).values(row(id));
        await audit(tx, { by: { teamId, userId }, at: new Date(), verb: 'test', subject: ids[0]! });
        if (fails) throw new Error('planned');
      }),
    );
    written.push(...ids);
  } catch (error) {
    if (!(error instanceof Error && error.message === 'planned')) throw error;
  }
}

const all: Promise<void>[] = [];
for (let round = 0; round < Number(rounds); round += 1)
  all.push(alone(), inTransaction(false), inTransaction(true));
await Promise.all(all);
console.log(JSON.stringify(written));
close();
