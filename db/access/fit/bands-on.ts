import {
  bootstrapBands,
  resample,
  type Bands,
  type FitAnswer,
  type PreparedFit,
} from '@/lib/inversion/index';
import { setImmediate as nextTurn } from 'node:timers/promises';

/** Small enough that other requests hardly wait: some tens of milliseconds of work at a time. */
const RESAMPLES_AT_ONCE = 25;
const DEPTHS_AT_ONCE = 100;

/**
 * Bootstrap bands on the given depths; null without resamples. The work yields between blocks, and
 * rows depend on the seed and their number alone, so that blocks change nothing.
 */
export async function bandsOn(
  prepared: PreparedFit,
  answer: FitAnswer,
  depthsNm: Float64Array,
  { seed, resamples }: { seed: number; resamples: number },
): Promise<Bands | null> {
  if (resamples === 0 || prepared.freeNames.length === 0) return null;
  const columns = prepared.freeNames.length;
  const rows = new Float64Array(resamples * columns);
  for (let first = 0; first < resamples; first += RESAMPLES_AT_ONCE) {
    const count = Math.min(RESAMPLES_AT_ONCE, resamples - first);
    rows.set(resample(prepared, answer, { seed, first, count }), first * columns);
    await nextTurn();
  }
  return blockwiseBands(prepared, answer, rows, depthsNm);
}

async function blockwiseBands(
  prepared: PreparedFit,
  answer: FitAnswer,
  rows: Float64Array,
  depthsNm: Float64Array,
): Promise<Bands> {
  const whole = {
    kind: 'bootstrap' as const,
    depthsNm,
    lower68: new Float64Array(depthsNm.length),
    upper68: new Float64Array(depthsNm.length),
    lower95: new Float64Array(depthsNm.length),
    upper95: new Float64Array(depthsNm.length),
  };
  for (let first = 0; first < depthsNm.length; first += DEPTHS_AT_ONCE) {
    const block = depthsNm.subarray(first, first + DEPTHS_AT_ONCE);
    const bands = bootstrapBands(prepared, answer, rows, block);
    for (const name of ['lower68', 'upper68', 'lower95', 'upper95'] as const)
      whole[name].set(bands[name], first);
    await nextTurn();
  }
  return whole;
}
