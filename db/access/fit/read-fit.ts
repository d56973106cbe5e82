import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import type { Fit } from '@/lib/schemas/fit';

import { fullFits } from './full-fits';

export async function readFit(ctx: Context, input: unknown): Promise<Fit> {
  const viewer = allow(ctx, 'read');
  const { id } = parse(byIdSchema, input);
  const [fit] = await fullFits(ctx.db, viewer, [id]);
  if (fit === undefined) throw new AppError('not_found', 'There is no such fit.');
  return fit;
}
