import { audit } from '@/db/access/audit';
import { canonicalJson } from '@/db/access/canonical-json';
import { pointsSha256 } from '@/db/access/content-hash';
import type { Context, Handle } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { sha256 } from '@/db/access/sha256';
import { loadStoppingSet } from '@/db/access/stopping-set/load-stopping-set';
import { transaction } from '@/db/access/transaction';
import { fits } from '@/db/schema/fits';
import { scans } from '@/db/schema/scans';
import { stoppingSets } from '@/db/schema/stopping-sets';
import { AppError } from '@/lib/errors';
import type { CarrierProfile, FitAnswer } from '@/lib/inversion/index';
import { saveFitSchema } from '@/lib/schemas/fit';
import { and, eq } from 'drizzle-orm';
import { randomUUID } from 'node:crypto';

import { firstDisagreement, type Claim } from './disagreement';
import { fitInputOf, frozenPoints } from './frozen-inputs';
import { ownedFit } from './owned-fit';
import { recompute, type Recomputed } from './recompute';

/**
 * Freezes a fit. What the browser claims is checked number by number against a computation from the
 * stored inputs, and the computed numbers are what is kept.
 */
export async function saveFit(ctx: Context, input: unknown): Promise<{ id: string }> {
  const viewer = allow(ctx, 'fit');
  const { claimed, spec, ...wanted } = parse(saveFitSchema, input);
  const { scan, set } = await ownedInputs(ctx.db, viewer.teamId, wanted);
  const points = frozenPoints(scan.points, spec.switchedOffKeV);
  const stopping = await loadStoppingSet(ctx.db, set.id);
  const computed = await recompute(
    fitInputOf({ observable: scan.observable, points, spec, stopping }),
    {
      seed: spec.seed,
      resamples: claimed.profile.bands === 'bootstrap' ? spec.resamples : 0,
      depthsNm: claimed.profile.points.map(({ depthNm }) => depthNm),
    },
  );
  refuseDisagreement(claimed, computed);
  refuseGaps(computed.carrierProfile);

  const id = randomUUID();
  const hashes = {
    pointsSha256: pointsSha256(points),
    stoppingSetSha256: set.sha256,
    inputsSha256: sha256(
      canonicalJson({
        observable: scan.observable,
        points: pointsSha256(points),
        stoppingSet: set.sha256,
        spec,
      }),
    ),
  };
  await transaction(ctx, async (tx) => {
    if (wanted.parentFitId !== null) await ownedFit(tx, viewer.teamId, wanted.parentFitId);
    await tx.insert(fits).values({
      ...wanted,
      answer: computed.answer,
      carrierProfile: computed.carrierProfile,
      checks: computed.checks,
      ...hashes,
      ...summaryOf(computed.answer),
      id,
      teamId: viewer.teamId,
      state: 'draft',
      observable: scan.observable,
      profile: spec.profile,
      spec,
      points,
      scanPointsSha256: scan.pointsSha256,
      createdAt: ctx.now,
      createdById: viewer.userId,
    });
    await audit(tx, { by: viewer, at: ctx.now, verb: 'save-fit', subject: wanted.name });
  });
  return { id };
}

interface Named {
  scanId: string;
  stoppingSetId: string;
}

async function ownedInputs(db: Handle, teamId: string, named: Named) {
  const [scan] = await db
    .select()
    .from(scans)
    .where(and(eq(scans.id, named.scanId), eq(scans.teamId, teamId)));
  if (scan === undefined) throw new AppError('not_found', 'There is no such scan.');
  const [set] = await db
    .select({ id: stoppingSets.id, sha256: stoppingSets.sha256 })
    .from(stoppingSets)
    .where(and(eq(stoppingSets.id, named.stoppingSetId), eq(stoppingSets.teamId, teamId)));
  if (set === undefined) throw new AppError('not_found', 'There is no such stopping set.');
  return { scan, set };
}

function refuseDisagreement(claimed: Claim, computed: Recomputed): void {
  const difference = firstDisagreement(claimed, computed);
  if (difference === null) return;
  const { what, claimed: theirs, recomputed } = difference;
  const message =
    `The fit was not saved: ${what} was given as ${theirs ?? 'nothing'}, ` +
    `but the stored inputs give ${recomputed ?? 'nothing'}. Fit again and save.`;
  throw new AppError('invalid', message, { [what]: message });
}

/** The depths are the browser's choice, but a profile must cover what the scan can see. */
function refuseGaps({ points, reachNm }: CarrierProfile): void {
  const ascending = points.every(
    ({ depthNm }, index) => depthNm > (points[index - 1]?.depthNm ?? -Infinity),
  );
  const whole = points[0]?.depthNm === 0 && (points.at(-1)?.depthNm ?? 0) >= reachNm;
  if (ascending && whole) return;
  const message = 'The fit was not saved: its depths do not run from the surface to the reach.';
  throw new AppError('invalid', message);
}

/** What lists show. */
function summaryOf(answer: FitAnswer) {
  const named = (name: string) => answer.parameters.find((parameter) => parameter.name === name);
  return {
    edge: named('edgeDepthNm'),
    width: named('edgeWidthNm'),
    chiSquare: answer.chiSquare,
    degreesOfFreedom: answer.degreesOfFreedom,
    aicc: answer.aicc,
  };
}
