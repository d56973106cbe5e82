import { fitInputOf, frozenPoints } from '@/db/access/fit/frozen-inputs';
import { recompute } from '@/db/access/fit/recompute';
import { saveFit } from '@/db/access/fit/save-fit';
import { acceptFit } from '@/db/access/review/accept-fit';
import { commentFit } from '@/db/access/review/comment-fit';
import { returnFit } from '@/db/access/review/return-fit';
import { submitFit } from '@/db/access/review/submit-fit';
import { readScan } from '@/db/access/scan/read-scan';
import { loadStoppingSet } from '@/db/access/stopping-set/load-stopping-set';
import type { DemoFit, DemoReviewEvent } from '@/db/demo/types';

import type { As, Ids } from './store';

/** Computes a fit as a browser would, saves it, and takes it through its history. */
export async function seedFit(as: As, fit: DemoFit, ids: Ids): Promise<string> {
  const ctx = as(fit.authorKey);
  const scanId = idOf(ids, fit.scanKey);
  const stoppingSetId = idOf(ids, fit.stoppingKey);
  const { name, notes, spec } = fit;
  const { observable, points } = await readScan(ctx, { id: scanId });
  const input = fitInputOf({
    observable,
    points: frozenPoints(points, spec.switchedOffKeV),
    spec,
    stopping: await loadStoppingSet(ctx.db, stoppingSetId),
  });
  const { answer, carrierProfile: profile } = await recompute(input, spec);
  const parentFitId = fit.parentKey === null ? null : idOf(ids, fit.parentKey);
  const claimed = { answer, profile };
  const wanted = { scanId, stoppingSetId, name, notes, parentFitId, spec, claimed };
  const { id } = await saveFit(ctx, wanted);
  for (const event of fit.events) await play(as, id, event);
  return id;
}

async function play(as: As, id: string, event: DemoReviewEvent): Promise<void> {
  const ctx = as(event.byKey);
  const { kind, body, target } = event;
  if (kind === 'submitted') await submitFit(ctx, { id, note: body });
  else if (kind === 'accepted') await acceptFit(ctx, { id, note: body });
  else if (kind === 'returned') await returnFit(ctx, { id, reason: body });
  else await commentFit(ctx, { id, body, target });
}

function idOf(ids: Ids, key: string): string {
  const id = ids[key];
  if (id === undefined) throw new Error(`The demo names ${key} before it is there.`);
  return id;
}
