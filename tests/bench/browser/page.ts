import { simulateScan } from '@/lib/inversion/index';
import { startInversionPool } from '@/workers/client';
import { fractionInput } from '../../inversion/support/scans';

const TRUTH = { edgeDepthNm: 78, edgeWidthNm: 16, levelTop: 0.74, levelBulk: 0.32 };
const RESAMPLES = 2000;

/** One run of the product's own pool, as the desk makes it; times in ms from the call. */
export interface TimedRun {
  workers: number;
  /** Fit, intervals, checks and preview bands are there. */
  firstMs: number;
  /** All resampled fits are there. */
  resampledMs: number;
  /** Bands and checks are there. */
  doneMs: number;
}

const template = fractionInput({}, 0.005);
const pool = startInversionPool();

async function timedRun(seed: number): Promise<TimedRun> {
  const input = { ...template, points: simulateScan({ input: template, values: TRUTH, seed }) };
  let firstMs = 0;
  let resampledMs = 0;
  const run = pool.run(
    { input, seed, resamples: RESAMPLES },
    {
      onFirst: (_, elapsedMs) => (firstMs = elapsedMs),
      onProgress: ({ done, elapsedMs }) => {
        if (done === RESAMPLES) resampledMs = elapsedMs;
      },
    },
  );
  const end = await run.end;
  if (end.status !== 'done') throw new Error(`The run ended as ${end.status}.`);
  return { workers: pool.size, firstMs, resampledMs, doneMs: end.elapsedMs };
}

Object.assign(window, { timedRun });
