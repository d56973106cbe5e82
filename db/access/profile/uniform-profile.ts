import type { Handle } from '@/db/access/context';
import { bandsOn } from '@/db/access/fit/bands-on';
import { fitInputOf } from '@/db/access/fit/frozen-inputs';
import { loadStoppingSet } from '@/db/access/stopping-set/load-stopping-set';
import { AppError } from '@/lib/errors';
import { carrierProfile, prepareFit, type CarrierProfile } from '@/lib/inversion/index';
import type { Fit } from '@/lib/schemas/fit';

export const MAX_EXPORT_ROWS = 20_000;

/**
 * The profile of a frozen fit on evenly spaced depths. Bands are resampled again with the seed of
 * the fit: bands interpolated between the depths of another grid would be too smooth at the edge.
 */
export async function uniformProfile(
  db: Handle,
  fit: Fit,
  stepNm: number,
): Promise<CarrierProfile> {
  const { points, spec, observable, answer, stoppingSetId } = fit;
  const depthsNm = uniformDepths(fit.carrierProfile.points.at(-1)?.depthNm ?? 0, stepNm);
  const stopping = await loadStoppingSet(db, stoppingSetId);
  const prepared = prepareFit(fitInputOf({ observable, points, spec, stopping }));
  const resamples = fit.carrierProfile.bands === 'bootstrap' ? spec.resamples : 0;
  const bands = await bandsOn(prepared, answer, depthsNm, { seed: spec.seed, resamples });
  return carrierProfile(prepared, answer, bands, { depthsNm });
}

function uniformDepths(endNm: number, stepNm: number): Float64Array {
  const rows = Math.floor(endNm / stepNm + 1e-9) + 1;
  if (rows > MAX_EXPORT_ROWS) {
    const message = `Step: ${stepNm} nm makes ${rows} rows down to ${endNm.toFixed(0)} nm; at most ${MAX_EXPORT_ROWS} are written. Choose a larger step.`;
    throw new AppError('invalid', message, { stepNm: message });
  }
  return Float64Array.from({ length: rows }, (_, row) => row * stepNm);
}
