import { audit } from '@/db/access/audit';
import type { Context } from '@/db/access/context';
import { ownedFit } from '@/db/access/fit/owned-fit';
import { parse } from '@/db/access/parse';
import { allow, allowDecision } from '@/db/access/policy';
import { transaction } from '@/db/access/transaction';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { acceptFitSchema } from '@/lib/schemas/fit';
import { randomUUID } from 'node:crypto';

import { addEvent } from './add-event';
import { changeState } from './change-state';
import { nextNumber } from './next-number';

/** Accepts a fit and issues its profile under the next number of the team. */
export async function acceptFit(
  ctx: Context,
  input: unknown,
): Promise<{ issuedProfileId: string; number: string }> {
  const viewer = allow(ctx, 'decide');
  const { id, note } = parse(acceptFitSchema, input);
  return transaction(ctx, async (tx) => {
    const fit = await ownedFit(tx, viewer.teamId, id);
    allowDecision(viewer, fit);
    await changeState(tx, { teamId: viewer.teamId, fitId: id, from: 'submitted', to: 'accepted' });
    await addEvent(tx, {
      fitId: id,
      kind: 'accepted',
      body: note,
      personId: viewer.userId,
      at: ctx.now,
    });
    const issuedProfileId = randomUUID();
    const numbering = await nextNumber(tx, viewer.teamId, ctx.now.getUTCFullYear());
    await tx.insert(issuedProfiles).values({
      ...numbering,
      id: issuedProfileId,
      teamId: viewer.teamId,
      fitId: id,
      issuedAt: ctx.now,
      issuedById: viewer.userId,
    });
    const subject = `${fit.name} as ${numbering.number}`;
    await audit(tx, { by: viewer, at: ctx.now, verb: 'accept-fit', subject });
    return { issuedProfileId, number: numbering.number };
  });
}
