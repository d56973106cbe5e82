import { audit } from '@/db/access/audit';
import { stoppingSha256 } from '@/db/access/content-hash';
import type { Context, Handle } from '@/db/access/context';
import { storeFile } from '@/db/access/file/store-file';
import { toBlob } from '@/db/access/float-blob';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { stoppingFiles } from '@/db/schema/stopping-files';
import { stoppingProfiles } from '@/db/schema/stopping-profiles';
import { stoppingSets } from '@/db/schema/stopping-sets';
import type { StoppingSet } from '@/lib/inversion/index';
import { createStoppingSetSchema } from '@/lib/schemas/stopping-set';
import { randomUUID } from 'node:crypto';

import { readUploadedSet } from './read-uploaded-set';

export async function createStoppingSet(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'edit data');
  const { meta, reading, files } = parse(createStoppingSetSchema, input);
  const { set, warnings } = await readUploadedSet({ reading, files });
  const id = randomUUID();
  await transaction(ctx, async (tx) => {
    await tx.insert(stoppingSets).values({
      ...meta,
      id,
      teamId: viewer.teamId,
      energiesKeV: set.profiles.map(({ energyKeV }) => energyKeV),
      bins: Math.max(...set.profiles.map(({ mass }) => mass.length)),
      warnings,
      reading,
      sha256: stoppingSha256(set.profiles),
      createdAt: ctx.now,
      createdById: viewer.userId,
    });
    await insertProfiles(tx, id, set);
    for (const [position, file] of files.entries()) {
      const fileId = await storeFile(tx, { ...viewer, now: ctx.now, ...file });
      await tx.insert(stoppingFiles).values({ stoppingSetId: id, position, fileId });
    }
    await audit(tx, { by: viewer, at: ctx.now, verb: 'create-stopping-set', subject: meta.name });
  });
  return { id };
}

async function insertProfiles(tx: Handle, stoppingSetId: string, set: StoppingSet): Promise<void> {
  for (const { energyKeV, edgesNm, mass, lostShare } of set.profiles) {
    await tx.insert(stoppingProfiles).values({
      stoppingSetId,
      energyKeV,
      edgesNm: toBlob(edgesNm),
      mass: toBlob(mass),
      lostShare,
    });
  }
}
