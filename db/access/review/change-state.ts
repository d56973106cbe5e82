import type { Handle } from '@/db/access/context';
import { fits, type FitState } from '@/db/schema/fits';
import { AppError } from '@/lib/errors';
import { and, eq } from 'drizzle-orm';

interface StateChange {
  teamId: string;
  fitId: string;
  from: FitState;
  to: FitState;
  submittedAt?: Date;
}

/** Moves a fit on if it still stands where the person saw it; of two people, one comes first. */
export async function changeState(tx: Handle, change: StateChange): Promise<void> {
  const { teamId, fitId, from, to, submittedAt } = change;
  const moved = await tx
    .update(fits)
    .set({ state: to, submittedAt })
    .where(and(eq(fits.id, fitId), eq(fits.teamId, teamId), eq(fits.state, from)))
    .returning({ id: fits.id });
  if (moved.length === 0)
    throw new AppError('conflict', `This fit is not ${WORDS[from]} any more. Reload the page.`);
}

const WORDS: Record<FitState, string> = {
  draft: 'a draft',
  submitted: 'in review',
  accepted: 'accepted',
  returned: 'returned',
};
