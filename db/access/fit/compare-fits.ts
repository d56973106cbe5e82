import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { AppError } from '@/lib/errors';
import { compareFitsSchema, type Fit } from '@/lib/schemas/fit';

import { fullFits } from './full-fits';

/** Fits of one scan side by side. Fits of different scans answer different questions. */
export async function compareFits(ctx: Context, input: unknown): Promise<Fit[]> {
  const viewer = allow(ctx, 'read');
  const ids = [...new Set(parse(compareFitsSchema, input).ids)];
  if (ids.length < 2) throw new AppError('invalid', 'Choose two different fits or more.');
  const fits = await fullFits(ctx.db, viewer, ids);
  if (fits.length < ids.length) throw new AppError('not_found', 'There is no such fit.');
  const scanNames = new Map(fits.map((fit) => [fit.scanId, fit.scanName]));
  if (scanNames.size > 1) {
    const names = [...scanNames.values()].join(', ');
    throw new AppError('invalid', `Only fits of one scan can be compared; these are of ${names}.`);
  }
  return fits;
}
