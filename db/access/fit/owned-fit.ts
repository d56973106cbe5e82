import type { Handle } from '@/db/access/context';
import { fits, type FitState } from '@/db/schema/fits';
import { AppError } from '@/lib/errors';
import { and, eq } from 'drizzle-orm';

export interface OwnedFit {
  id: string;
  name: string;
  state: FitState;
  createdById: string;
}

/** A fit of the team, or a refusal. */
export async function ownedFit(tx: Handle, teamId: string, id: string): Promise<OwnedFit> {
  const [fit] = await tx
    .select({ id: fits.id, name: fits.name, state: fits.state, createdById: fits.createdById })
    .from(fits)
    .where(and(eq(fits.id, id), eq(fits.teamId, teamId)));
  if (fit === undefined) throw new AppError('not_found', 'There is no such fit.');
  return fit;
}
