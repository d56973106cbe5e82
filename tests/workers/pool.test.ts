import { describe, expect, it } from 'vitest';

import { HandBroken } from '@/workers/hand';
import type { FitRequest, Progress, RunListener } from '@/workers/pool';
import type { FirstAnswer } from '@/workers/protocol';

import { inProcessPool } from './in-process-pool';
import { workedInput } from './worked-scan';

const request = (resamples: number): FitRequest => ({ input: workedInput(), seed: 11, resamples });

function listener() {
  const seen: { first: FirstAnswer[]; progress: Progress[] } = { first: [], progress: [] };
  const hears: RunListener = {
    onFirst: (first) => seen.first.push(first),
    onProgress: (progress) => seen.progress.push(progress),
  };
  return { seen, hears };
}

async function bandsWith(size: number, seed = 11) {
  const { pool } = inProcessPool(size);
  const end = await pool.run({ ...request(110), seed }, listener().hears).end;
  if (end.status !== 'done' || !end.bands)
    throw new Error(`expected bands, got ${JSON.stringify(end)}`);
  return end.bands.profile.points;
}

describe('a run', () => {
  it('gives a first answer with delta bands, then bands from resampling', async () => {
    const { pool } = inProcessPool(2);
    const { seen, hears } = listener();
    const end = await pool.run(request(60), hears).end;
    expect(seen.first).toHaveLength(1);
    expect(seen.first[0]?.profile.bands).toBe('delta');
    expect(end).toMatchObject({ status: 'done', bands: { profile: { bands: 'bootstrap' } } });
    expect(seen.progress.at(-1)).toMatchObject({ done: 60, total: 60 });
  });

  it('answers to the last bit the same whatever the pool size', async () => {
    const one = await bandsWith(1);
    for (const size of [2, 3, 4]) expect(await bandsWith(size)).toStrictEqual(one);
  });

  it('answers otherwise for another seed', async () => {
    expect(await bandsWith(2, 12)).not.toStrictEqual(await bandsWith(2, 11));
  });

  it('asks for no bands with zero resamples', async () => {
    const { pool } = inProcessPool(1);
    expect(await pool.run(request(0), listener().hears).end).toMatchObject({
      status: 'done',
      bands: null,
    });
  });

  it('resamples nothing when every parameter is held', async () => {
    const hold = (value: number) => ({ held: true, value, prior: null });
    const input = workedInput({
      profile: 'sharp',
      parameters: {
        edgeDepthNm: hold(80),
        levelTop: hold(0.74),
        levelBulk: hold(0.32),
        depthScale: hold(1),
      },
    });
    const { pool } = inProcessPool(1);
    expect(await pool.run({ input, seed: 1, resamples: 100 }, listener().hears).end).toMatchObject({
      status: 'done',
      bands: null,
    });
  });

  it('hands on the sentence of a refusal', async () => {
    const input = workedInput();
    const points = input.points.map((point, index) => ({ ...point, enabled: index < 2 }));
    const { pool } = inProcessPool(1);
    const end = await pool.run(
      { input: { ...input, points }, seed: 1, resamples: 10 },
      listener().hears,
    ).end;
    expect(end).toMatchObject({ status: 'refused', code: 'too-few-points' });
    expect(end.status === 'refused' && end.message).toMatch(/4 free parameters but only 2 points/);
  });
});

describe('stopping', () => {
  it('ends the run within 100 ms and no more blocks are asked for', async () => {
    let blocks = 0;
    const { pool } = inProcessPool(2, (api) => ({
      ...api,
      resample: async (job, block) => {
        blocks++;
        await new Promise((resolve) => setTimeout(resolve, 5));
        return api.resample(job, block);
      },
    }));
    const { hears } = listener();
    const run = pool.run(request(5_000), { ...hears, onProgress: () => run.stop() });
    expect((await run.end).status).toBe('stopped');
    const asked = blocks;
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(blocks).toBeLessThanOrEqual(asked + 2);
    expect(asked).toBeLessThan(200);
  });

  it('ends a worker that does not let go, and starts another for the next run', async () => {
    const { pool, ended } = inProcessPool(1, (api, index) =>
      index === 0
        ? { ...api, fit: () => new Promise(() => {}), close: () => new Promise(() => {}) }
        : api,
    );
    const run = pool.run(request(10), listener().hears);
    await new Promise((resolve) => setTimeout(resolve, 5));
    run.stop();
    expect((await run.end).status).toBe('stopped');
    // The caller does not wait for the worker: it has not even been ended yet.
    expect(ended).toEqual([]);
    // Asked for at once, the next run must not land on the worker that is about to be ended.
    expect((await pool.run(request(0), listener().hears).end).status).toBe('done');
    expect(ended).toEqual([0]);
  });

  it('takes a comparison to a new worker when a stop ended the one it was on', async () => {
    const { pool, ended } = inProcessPool(1, (api, index) =>
      index === 0
        ? { ...api, fit: () => new Promise(() => {}), close: () => new Promise(() => {}) }
        : api,
    );
    const replies = pool.fitEach([workedInput()]);
    const run = pool.run(request(10), listener().hears);
    await new Promise((resolve) => setTimeout(resolve, 5));
    run.stop();
    expect((await replies)[0]?.ok).toBe(true);
    expect(ended).toEqual([0]);
  });

  it('settles waiting calls when the pool ends', async () => {
    const { pool } = inProcessPool(1, (api) => ({ ...api, fit: () => new Promise(() => {}) }));
    const run = pool.run(request(10), listener().hears);
    pool.end();
    expect((await run.end).status).toBe('stopped');
  });
});

describe('a worker that fails', () => {
  it('is named in the refusal', async () => {
    const { pool } = inProcessPool(1, (api) => ({
      ...api,
      fit: () => Promise.reject(new HandBroken('The fitting worker could not be loaded.')),
    }));
    expect(await pool.run(request(10), listener().hears).end).toEqual({
      status: 'refused',
      code: 'worker',
      message: 'The fitting worker could not be loaded.',
    });
  });
});

describe('fitting several inputs', () => {
  it('answers in the order of the inputs', async () => {
    const { pool } = inProcessPool(2);
    const kinds = ['sharp', 'graded', 'sharp'] as const;
    const replies = await pool.fitEach(kinds.map((profile) => workedInput({ profile })));
    const widths = replies.map(
      (reply) =>
        reply.ok && reply.value.answer.parameters.some(({ name }) => name === 'edgeWidthNm'),
    );
    expect(widths).toEqual([false, true, false]);
  });
});
