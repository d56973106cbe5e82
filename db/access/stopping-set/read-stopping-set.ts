import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { files } from '@/db/schema/files';
import { stoppingFiles } from '@/db/schema/stopping-files';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import type { StoppingSetAnswer } from '@/lib/schemas/stopping-set';
import { asc, eq } from 'drizzle-orm';

import { loadStoppingSet } from './load-stopping-set';
import { stoppingSetRows } from './stopping-set-rows';

export async function readStoppingSet(ctx: Context, input: unknown): Promise<StoppingSetAnswer> {
  const viewer = allow(ctx, 'read');
  const { id } = parse(byIdSchema, input);
  const [row] = await stoppingSetRows(ctx.db, viewer.teamId, eq(stoppingSets.id, id));
  if (row === undefined) throw new AppError('not_found', 'There is no such stopping set.');
  const { profiles } = await loadStoppingSet(ctx.db, id);
  return {
    ...row,
    files: await originalFiles(ctx, id),
    profiles: profiles.map(({ energyKeV, edgesNm, mass, lostShare }) => ({
      energyKeV,
      edgesNm: [...edgesNm],
      mass: [...mass],
      lostShare,
    })),
  };
}

function originalFiles(ctx: Context, stoppingSetId: string) {
  return ctx.db
    .select({
      id: files.id,
      name: files.name,
      sha256: files.sha256,
      byteLength: files.byteLength,
    })
    .from(stoppingFiles)
    .innerJoin(files, eq(files.id, stoppingFiles.fileId))
    .where(eq(stoppingFiles.stoppingSetId, stoppingSetId))
    .orderBy(asc(stoppingFiles.position));
}
