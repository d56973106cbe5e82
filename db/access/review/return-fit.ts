import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { ownedFit } from '@/db/access/fit/owned-fit';
import { parse } from '@/db/access/parse';
import { allow, allowDecision } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { returnFitSchema } from '@/lib/schemas/fit';

import { addEvent } from './add-event';
import { changeState } from './change-state';

/** Sends a fit back with a reason; it is revised as a new fit. */
export async function returnFit(ctx: Context, input: unknown): Promise<null> {
  const viewer = allow(ctx, 'decide');
  const { id, reason } = parse(returnFitSchema, input);
  return transaction(ctx, async (tx) => {
    const fit = await ownedFit(tx, viewer.teamId, id);
    allowDecision(viewer, fit);
    await changeState(tx, { teamId: viewer.teamId, fitId: id, from: 'submitted', to: 'returned' });
    await addEvent(tx, {
      fitId: id,
      kind: 'returned',
      body: reason,
      personId: viewer.userId,
      at: ctx.now,
    });
    await audit(tx, { by: viewer, at: ctx.now, verb: 'return-fit', subject: fit.name });
    return null;
  });
}
