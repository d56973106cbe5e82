import type { Handle } from '@/db/access/context';
import { mayWithFit } from '@/db/access/policy';
import { fits } from '@/db/schema/fits';
import { reviewEvents } from '@/db/schema/review-events';
import { scans } from '@/db/schema/scans';
import { users } from '@/db/schema/users';
import { fitSchema, type Fit, type FitRow, type ReviewEvent } from '@/lib/schemas/fit';
import type { Viewer } from '@/lib/schemas/person';
import { asc, eq, inArray } from 'drizzle-orm';
import { alias } from 'drizzle-orm/sqlite-core';

import { fitRows } from './fit-rows';

const parents = alias(fits, 'parents');

/** The fits with these ids that the viewer's team has, whole, in the order of the ids. */
export async function fullFits(db: Handle, viewer: Viewer, ids: readonly string[]): Promise<Fit[]> {
  const rows = await fitRows(db, viewer.teamId, inArray(fits.id, [...ids]));
  const found = await Promise.all(rows.map((row) => completed(db, viewer, row)));
  return ids.flatMap((id) => found.find((fit) => fit.id === id) ?? []);
}

async function completed(db: Handle, viewer: Viewer, row: FitRow): Promise<Fit> {
  const [stored] = await db
    .select({ fit: fits, parentName: parents.name, scanPointsSha256: scans.pointsSha256 })
    .from(fits)
    .innerJoin(scans, eq(scans.id, fits.scanId))
    .leftJoin(parents, eq(parents.id, fits.parentFitId))
    .where(eq(fits.id, row.id));
  if (stored === undefined) throw new Error(`Fit ${row.id} went away while it was read.`);
  const { fit, parentName } = stored;
  // Parsed on the way out: what was frozen by an older version must still be what pages expect.
  return fitSchema.parse({
    ...row,
    notes: fit.notes,
    parent: fit.parentFitId === null ? null : { id: fit.parentFitId, name: parentName },
    observable: fit.observable,
    spec: fit.spec,
    points: fit.points,
    answer: fit.answer,
    carrierProfile: fit.carrierProfile,
    checks: fit.checks,
    hashes: {
      points: fit.pointsSha256,
      stoppingSet: fit.stoppingSetSha256,
      inputs: fit.inputsSha256,
    },
    scanChangedSince: fit.scanPointsSha256 !== stored.scanPointsSha256,
    events: await eventsOf(db, row.id),
    may: mayWithFit(viewer, row),
  });
}

async function eventsOf(db: Handle, fitId: string): Promise<ReviewEvent[]> {
  const rows = await db
    .select({
      id: reviewEvents.id,
      kind: reviewEvents.kind,
      body: reviewEvents.body,
      target: reviewEvents.target,
      person: users.name,
      at: reviewEvents.at,
    })
    .from(reviewEvents)
    .innerJoin(users, eq(users.id, reviewEvents.personId))
    .where(eq(reviewEvents.fitId, fitId))
    .orderBy(asc(reviewEvents.position));
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}
