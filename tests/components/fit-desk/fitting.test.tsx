import { describe, expect, it } from 'vitest';

import { fitting, NOTHING_FITTED } from '@/components/fit-desk/fitting';
import { comparisonKey, questionKey } from '@/components/fit-desk/question';
import { held, withSetting } from '@/components/fit-desk/assumptions';
import { fitToSave } from '@/components/fit-desk/fit-to-save';
import type { FirstAnswer } from '@/workers/protocol';

import { workedInput } from '../../workers/worked-scan';
import { sharpProfile } from '../charts/sample-data';
import { assumptions } from './desk-data';

const first: FirstAnswer = {
  answer: {
    status: 'converged',
    parameters: [],
    chiSquare: 8.9,
    dataChiSquare: 8.9,
    degreesOfFreedom: 9,
    pValue: 0.45,
    freeParameters: 4,
    aicc: 21.9,
    bic: 19,
    covariance: { ok: false, reason: 'none in this test' },
    residuals: [],
    evidence: { folds: 1, starts: 1, iterations: 1, predictedReduction: 0 },
  },
  profile: sharpProfile({ bands: 'delta' }),
  checks: [],
  information: { depthsNm: new Float64Array(1), values: new Float64Array(1) },
  edgeInformation: [],
};
const started = fitting(NOTHING_FITTED, { run: 1, type: 'started' });
const answered = fitting(started, {
  run: 1,
  type: 'first',
  key: 'A',
  input: workedInput(),
  first,
  elapsedMs: 4,
});

describe('a run as the desk hears it', () => {
  it('shows the first answer at once, not yet whole', () => {
    expect(answered.good).toMatchObject({ key: 'A', complete: false, profile: { bands: 'delta' } });
    expect(answered.run).toBe(1);
  });

  it('takes the bands when they come', () => {
    const bands = { profile: sharpProfile(), checks: [] };
    const done = fitting(answered, { run: 1, type: 'done', bands, elapsedMs: 900 });
    expect(done.good).toMatchObject({
      complete: true,
      profile: { bands: 'bootstrap' },
      elapsedMs: 900,
    });
    expect(done.run).toBeNull();
  });

  it('is whole with its quick bands when none were asked for', () => {
    const done = fitting(answered, { run: 1, type: 'done', bands: null, elapsedMs: 5 });
    expect(done.good).toMatchObject({ complete: true, profile: { bands: 'delta' } });
  });

  it('keeps the last good result until a new one is there, through a refusal and a stop', () => {
    const again = fitting(answered, { run: 2, type: 'started' });
    expect(again.good?.key).toBe('A');
    const refused = fitting(again, {
      run: 2,
      type: 'refused',
      code: 'x',
      message: 'Too few points.',
    });
    expect(refused.good?.key).toBe('A');
    expect(refused.refusal?.message).toBe('Too few points.');
    expect(fitting(again, { run: 2, type: 'stopped' }).good?.key).toBe('A');
  });

  it('does not hear a run that was overtaken', () => {
    const overtaken = fitting(started, { run: 2, type: 'started' });
    const late = fitting(overtaken, {
      run: 1,
      type: 'first',
      key: 'late',
      input: workedInput(),
      first,
      elapsedMs: 4,
    });
    expect(late).toBe(overtaken);
  });
});

describe('out of date', () => {
  const scan = { id: 'scan', pointsSha256: 'points' };
  const key = (change: (from: ReturnType<typeof assumptions>) => ReturnType<typeof assumptions>) =>
    questionKey(scan, 'set', change(assumptions()));
  const base = key((same) => same);

  it('is not said for what plays no part: where a number comes from, the start of a free parameter', () => {
    expect(key((from) => withSetting(from, 'depthScale', { origin: 'handbook' }))).toBe(base);
    expect(key((from) => withSetting(from, 'edgeDepthNm', { value: 55 }))).toBe(base);
  });

  it('is said for what does', () => {
    expect(key((from) => held(from, 'edgeDepthNm', 55))).not.toBe(base);
    expect(key((from) => ({ ...from, switchedOffKeV: [4] }))).not.toBe(base);
    expect(key((from) => ({ ...from, seed: 2 }))).not.toBe(base);
    expect(questionKey({ ...scan, pointsSha256: 'edited' }, 'set', assumptions())).not.toBe(base);
  });

  it('is not said of a comparison for another profile or seed, which it has in common', () => {
    const compared = comparisonKey(scan, 'set', assumptions());
    expect(comparisonKey(scan, 'set', { ...assumptions(), profile: 'sharp', seed: 9 })).toBe(
      compared,
    );
    expect(comparisonKey(scan, 'set', { ...assumptions(), polarity: 'accumulation' })).not.toBe(
      compared,
    );
  });
});

describe('saving', () => {
  const ask = { scanId: 'scan', parentFitId: null, assumptions: assumptions() };

  it('waits for a fit, for its bands and for a result that is not out of date', () => {
    expect(fitToSave({ ...ask, good: null, outOfDate: false }).waitsFor).toMatch(/no fit to save/);
    expect(fitToSave({ ...ask, good: answered.good, outOfDate: false }).waitsFor).toMatch(
      /bands are not there/,
    );
    expect(fitToSave({ ...ask, good: answered.good, outOfDate: true }).waitsFor).toMatch(
      /something changed/,
    );
  });

  it('claims the answer and the profile that are shown', () => {
    const done = fitting(answered, {
      run: 1,
      type: 'done',
      bands: { profile: sharpProfile(), checks: [] },
      elapsedMs: 9,
    });
    const { fit } = fitToSave({ ...ask, good: done.good, outOfDate: false });
    expect(fit?.claimed.profile.bands).toBe('bootstrap');
    expect(fit?.spec).not.toHaveProperty('stoppingSetId');
  });
});
