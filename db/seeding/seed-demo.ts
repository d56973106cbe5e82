import { createSample } from '@/db/access/sample/create-sample';
import { createScan } from '@/db/access/scan/create-scan';
import { createStoppingSet } from '@/db/access/stopping-set/create-stopping-set';
import type { Database } from '@/db/client';
import type { DemoData, DemoFile } from '@/db/demo/types';
import { samples } from '@/db/schema/samples';
import { scans } from '@/db/schema/scans';
import { sessions } from '@/db/schema/sessions';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { teams } from '@/db/schema/teams';
import { eq, inArray } from 'drizzle-orm';

import { seedFit } from './seed-fit';
import { seedPeople } from './seed-people';
import type { Ids, Store } from './store';

const encoder = new TextEncoder();

/** The demo team through the same verbs as any other: files are stored, fits recomputed, reviews recorded. */
export async function seedDemo(store: Store, demo: DemoData): Promise<void> {
  const people = await seedPeople(store, demo);
  const author = 'analyst';
  const ids: Ids = {};
  for (const { key, input } of demo.samples)
    ids[key] = (await createSample(people.as(author), input)).id;
  for (const { key, meta, reading, files } of demo.stoppingSets)
    ids[key] = (
      await createStoppingSet(people.as(author), { meta, reading, files: files.map(uploaded) })
    ).id;
  for (const { key, sampleKey, meta, reading, file } of demo.scans) {
    const source = { kind: 'file', reading, ...uploaded(file) };
    ids[key] = (await createScan(people.as(author), { sampleId: ids[sampleKey], meta, source })).id;
  }
  for (const fit of demo.fits) ids[fit.key] = await seedFit(people.as, fit, ids);
  await markInvented(store.db, people.teamId, people.userIds);
}

function uploaded({ fileName, text }: DemoFile) {
  return { name: fileName, bytes: encoder.encode(text) };
}

/** The last step: only now does the team count as seeded. */
async function markInvented(db: Database, teamId: string, userIds: string[]): Promise<void> {
  await db.transaction(async (tx) => {
    for (const table of [samples, scans, stoppingSets])
      await tx.update(table).set({ invented: true }).where(eq(table.teamId, teamId));
    await tx.delete(sessions).where(inArray(sessions.userId, userIds));
    await tx.update(teams).set({ invented: true }).where(eq(teams.id, teamId));
  });
}
