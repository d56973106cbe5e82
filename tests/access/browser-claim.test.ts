import { fitInputOf, stoppingSetOf } from '@/components/fit-desk/fit-input';
import { readFit } from '@/db/access/fit/read-fit';
import { saveFit } from '@/db/access/fit/save-fit';
import { readScan } from '@/db/access/scan/read-scan';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';
import type { FitSpec } from '@/lib/schemas/fit';
import { beforeAll, describe, expect, it } from 'vitest';

import { SPEC, testData, type TestData } from '../support/data';
import { testDatabase } from '../support/database';
import { personWithTeam, type TestPerson } from '../support/people';
import { inProcessPool } from '../workers/in-process-pool';

const asJson = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T;

/** The whole way of the fit desk: what the server hands out, through the pool, and back as JSON. */
describe('what the fit desk computes is what the server computes', async () => {
  const database = await testDatabase();
  let analyst: TestPerson;
  let data: TestData;
  beforeAll(async () => {
    analyst = await personWithTeam(database);
    data = await testData(analyst);
  });

  const free = { held: false, value: null, prior: { mean: 1, sigma: 0.03 }, origin: '' };
  const specs: [string, Partial<FitSpec>][] = [
    ['a graded edge with bands from resampling', { resamples: 130 }],
    ['a sharp edge', { profile: 'sharp', resamples: 130 }],
    ['bands from the covariance', { resamples: 0 }],
    ['a free depth scale with its prior', { parameters: { depthScale: free }, resamples: 60 }],
    ['a point switched off', { switchedOffKeV: [12], resamples: 60 }],
    [
      'a cap and the other polarity',
      { capThicknessNm: 12, polarity: 'accumulation', resamples: 0 },
    ],
  ];

  it.each(specs)('%s', (_, given) => saves(given));

  /**
   * Another browser may compute exponentials and logarithms one last bit differently. Stops that are
   * off by some thousand last bits stand for that, with a margin.
   */
  it.each(specs)('%s, in a browser with other rounding', (_, given) => saves(given, 1e-12));

  async function saves(given: Partial<FitSpec>, rounding = 0): Promise<void> {
    const spec = { ...SPEC, ...given };
    const ctx = await analyst.context();
    const scan = asJson(await readScan(ctx, { id: data.scanId }));
    const set = asJson(await readStoppingSet(ctx, { id: data.stoppingSetId }));
    for (const { mass } of set.profiles)
      mass.forEach((share, bin) => (mass[bin] = share * (1 + rounding * Math.sin(bin))));
    const input = fitInputOf(scan, spec, stoppingSetOf(set));

    const { pool } = inProcessPool(3);
    const firsts: Parameters<Parameters<typeof pool.run>[1]['onFirst']>[0][] = [];
    const run = pool.run(
      { input, seed: spec.seed, resamples: spec.resamples },
      { onFirst: (first) => firsts.push(first), onProgress: () => {} },
    );
    const end = await run.end;
    pool.end();
    if (end.status !== 'done') throw new Error(`The pool ended as ${end.status}.`);
    const [first] = firsts;
    if (first === undefined) throw new Error('The pool gave no first answer.');

    const profile = end.bands?.profile ?? first.profile;
    const claimed = asJson({ answer: first.answer, profile });
    const { scanId, stoppingSetId } = data;
    const wanted = {
      scanId,
      stoppingSetId,
      name: 'From the desk',
      parentFitId: null,
      spec,
      claimed,
    };
    const { id } = await saveFit(await analyst.context(), wanted);
    const saved = await readFit(await analyst.context(), { id });
    expect(saved.carrierProfile.bands).toBe(spec.resamples > 0 ? 'bootstrap' : 'delta');
    expect(saved.checks.map((check) => check.id)).toEqual(
      (end.bands?.checks ?? first.checks).map((check) => check.id),
    );
  }
});
