import { describe, expect, it } from 'vitest';

import {
  freed,
  held,
  parameterNames,
  settingOf,
  specOf,
  toggled,
} from '@/components/fit-desk/assumptions';
import { assumptionHistory, startHistory } from '@/components/fit-desk/assumption-history';
import { fitSpecSchema } from '@/lib/schemas/fit';

import { assumptions } from './desk-data';

describe('assumptions', () => {
  it('take the scale of carriers and the cap from the sample', () => {
    const { carriers, capThicknessNm } = assumptions();
    expect(carriers).toEqual({ bulkPerCm3: 6.2e15, bulkSigmaPerCm3: 4e14, topPerCm3: null });
    expect(capThicknessNm).toBe(4);
  });

  it('have a response that fits the observable, and pass the schema of a saved fit', () => {
    expect(assumptions('fraction').response.kind).toBe('two-level');
    expect(assumptions('rate').response.kind).toBe('capture-rate');
    for (const observable of ['fraction', 'rate'] as const) {
      expect(fitSpecSchema.safeParse(specOf(assumptions(observable))).success).toBe(true);
    }
  });

  it('hold the depth scale at 1; set free it brings its usual prior 1.00 ± 0.03 (common practice, no source)', () => {
    expect(settingOf(assumptions(), 'depthScale')).toMatchObject({ held: true, value: 1 });
    const free = freed(assumptions(), 'depthScale');
    expect(settingOf(free, 'depthScale')).toMatchObject({
      held: false,
      prior: { mean: 1, sigma: 0.03 },
    });
  });

  it('keep the prior of a parameter that is held and set free again', () => {
    const start = freed(assumptions(), 'depthScale');
    const again = freed(held(start, 'depthScale', 1.02), 'depthScale');
    expect(settingOf(again, 'depthScale').prior).toEqual({ mean: 1, sigma: 0.03 });
  });

  it('list the parameters of a trial profile: no width for a sharp edge, no cap level without a cap', () => {
    expect(parameterNames('sharp', 0)).toEqual([
      'edgeDepthNm',
      'levelTop',
      'levelBulk',
      'depthScale',
    ]);
    expect(parameterNames('graded', 4)).toEqual([
      'edgeDepthNm',
      'edgeWidthNm',
      'levelTop',
      'levelBulk',
      'levelCap',
      'depthScale',
    ]);
  });

  it('switch a point off and on, in the order of energy', () => {
    const off = toggled(toggled(assumptions(), 18), 4);
    expect(off.switchedOffKeV).toEqual([4, 18]);
    expect(toggled(off, 18).switchedOffKeV).toEqual([4]);
  });
});

describe('history', () => {
  const seeded = (seed: number) => (present: ReturnType<typeof assumptions>) => ({
    ...present,
    seed,
  });
  const start = startHistory(assumptions());
  const change = (history: typeof start, seed: number, kind?: string) =>
    assumptionHistory(history, { type: 'change', kind, change: seeded(seed) });

  it('takes back and brings again', () => {
    const changed = change(change(start, 2), 3);
    const back = assumptionHistory(changed, { type: 'undo' });
    expect(back.present.seed).toBe(2);
    expect(assumptionHistory(back, { type: 'redo' }).present.seed).toBe(3);
  });

  it('takes typing in one field as one step', () => {
    const typed = change(change(change(start, 12, 'seed'), 123, 'seed'), 1234, 'seed');
    expect(assumptionHistory(typed, { type: 'undo' }).present.seed).toBe(start.present.seed);
  });

  it('starts a new step after another kind of change', () => {
    const mixed = change(change(start, 2, 'seed'), 3, 'other');
    expect(assumptionHistory(mixed, { type: 'undo' }).present.seed).toBe(2);
  });

  it('forgets what was undone when something else is changed', () => {
    const back = assumptionHistory(change(start, 2), { type: 'undo' });
    expect(assumptionHistory(change(back, 5), { type: 'redo' }).present.seed).toBe(5);
  });

  it('makes no step of a change that changes nothing', () => {
    expect(change(start, start.present.seed).past).toHaveLength(0);
  });

  it('has nothing to take back at the start', () => {
    expect(assumptionHistory(start, { type: 'undo' })).toEqual(start);
    expect(assumptionHistory(start, { type: 'redo' })).toEqual(start);
  });
});
