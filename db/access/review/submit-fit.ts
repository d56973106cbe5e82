import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { ownedFit } from '@/db/access/fit/owned-fit';
import { parse } from '@/db/access/parse';
import { allow, allowSubmit } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { submitFitSchema } from '@/lib/schemas/fit';

import { addEvent } from './add-event';
import { changeState } from './change-state';

export async function submitFit(ctx: Context, input: unknown): Promise<null> {
  const viewer = allow(ctx, 'fit');
  const { id, note } = parse(submitFitSchema, input);
  return transaction(ctx, async (tx) => {
    const fit = await ownedFit(tx, viewer.teamId, id);
    allowSubmit(viewer, fit);
    await changeState(tx, {
      teamId: viewer.teamId,
      fitId: id,
      from: 'draft',
      to: 'submitted',
      submittedAt: ctx.now,
    });
    await addEvent(tx, {
      fitId: id,
      kind: 'submitted',
      body: note,
      personId: viewer.userId,
      at: ctx.now,
    });
    await audit(tx, { by: viewer, at: ctx.now, verb: 'submit-fit', subject: fit.name });
    return null;
  });
}
