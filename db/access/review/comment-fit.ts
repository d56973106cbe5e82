import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { ownedFit } from '@/db/access/fit/owned-fit';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { commentFitSchema } from '@/lib/schemas/fit';

import { addEvent } from './add-event';

export async function commentFit(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'comment');
  const { id, body, target } = parse(commentFitSchema, input);
  return transaction(ctx, async (tx) => {
    const fit = await ownedFit(tx, viewer.teamId, id);
    const event = { fitId: id, kind: 'comment' as const, body, target, personId: viewer.userId };
    const eventId = await addEvent(tx, { ...event, at: ctx.now });
    await audit(tx, { by: viewer, at: ctx.now, verb: 'comment-fit', subject: fit.name });
    return { id: eventId };
  });
}
