import { describe, expect, it } from 'vitest';

import { deskKey } from '@/components/fit-desk/desk-keys';
import { figureName } from '@/components/fit-desk/figure-name';
import { leastUncovered, pointsOf, uncoveredEnergies } from '@/components/fit-desk/fit-input';
import { curveEnergies } from '@/components/fit-desk/prepared';
import { numberText, readNumber } from '@/components/fit-desk/read-number';
import { refusalOf } from '@/components/fit-desk/fetch-json';
import { scaleErrorOf } from '@/components/fit-desk/profile-series';

import { workedInput } from '../../workers/worked-scan';

describe('a typed number', () => {
  it('may have a decimal comma or an exponent', () => {
    expect(readNumber('78,4', 'Edge', {}, false)).toEqual({ ok: true, value: 78.4 });
    expect(readNumber(' 6.2e15 ', 'Bulk', {}, false)).toEqual({ ok: true, value: 6.2e15 });
  });

  it('is not known when blank, never zero', () => {
    expect(readNumber('', 'Bulk', {}, true)).toEqual({ ok: true, value: null });
    expect(readNumber('', 'Bulk', {}, false)).toEqual({
      ok: false,
      message: 'Bulk: a number is needed.',
    });
  });

  it('says what was expected', () => {
    const said = (text: string, range: Parameters<typeof readNumber>[2]) => {
      const read = readNumber(text, 'Seed', range, false);
      return read.ok ? null : read.message;
    };
    expect(said('deep', {})).toBe('Seed: expected a number such as 78.4 or 6.2e15.');
    expect(said('1.5', { whole: true })).toBe('Seed: expected a whole number.');
    expect(said('0', { above: 0 })).toBe('Seed: expected a number above 0.');
    expect(said('-1', { min: 0 })).toBe('Seed: expected a number of at least 0.');
    expect(said('11', { max: 10 })).toBe('Seed: expected a number of at most 10.');
    expect(said('Infinity', {})).toMatch(/expected a number/);
  });

  it('is shown as it would be typed', () => {
    expect([6.2e15, 78.4, 0, 1e-6, null].map(numberText)).toEqual([
      '6.2e15',
      '78.4',
      '0',
      '1e-6',
      '',
    ]);
  });
});

describe('keys of the desk', () => {
  const press = (key: string, target: Element = document.body, more: Partial<KeyboardEvent> = {}) =>
    deskKey({
      key,
      target,
      ctrlKey: false,
      metaKey: false,
      shiftKey: false,
      altKey: false,
      ...more,
    });
  const make = (tag: string, type?: string) => {
    const element = document.createElement(tag);
    if (type) element.setAttribute('type', type);
    return element;
  };

  it('fit with Enter, but not where Enter means something else', () => {
    expect(press('Enter')).toBe('fit');
    for (const tag of ['button', 'a', 'summary', 'input', 'textarea', 'select'])
      expect(press('Enter', make(tag))).toBeNull();
  });

  it('take back with Ctrl+Z and bring again, but leave a text field its own', () => {
    expect(press('z', document.body, { ctrlKey: true })).toBe('undo');
    expect(press('Z', document.body, { metaKey: true, shiftKey: true })).toBe('redo');
    expect(press('y', document.body, { ctrlKey: true })).toBe('redo');
    expect(press('z', make('input'), { ctrlKey: true })).toBeNull();
    expect(press('z', make('input', 'checkbox'), { ctrlKey: true })).toBe('undo');
  });
});

describe('points and energies', () => {
  const points = [2, 6, 24].map((energyKeV) => ({
    energyKeV,
    value: 0.5,
    sigma: 0.01,
    enabled: energyKeV !== 2,
  }));

  it('stay off when the scan or the fit has them off', () => {
    expect(pointsOf(points, [6]).map(({ enabled }) => enabled)).toEqual([false, false, true]);
  });

  it('outside a ladder are named, those switched off are not', () => {
    expect(uncoveredEnergies(points, [4, 8, 20])).toEqual([24]);
    expect(uncoveredEnergies(points, [4, 24])).toEqual([]);
    expect(leastUncovered(points, [{ energiesKeV: [8, 20] }, { energiesKeV: [4, 20] }])).toEqual([
      24,
    ]);
    expect(leastUncovered(points, [])).toEqual([]);
  });

  it('of a curve stay inside both scan and stopping set', () => {
    const { points: scan, stopping } = workedInput();
    const energies = curveEnergies({ points: [...scan, { ...scan[0]!, energyKeV: 60 }], stopping });
    expect([energies[0], energies.at(-1)]).toEqual([2, 22]);
  });
});

describe('small rules', () => {
  it('names files so that every system takes them', () => {
    expect(figureName('HX-204', '205 K, dark')).toBe('hx-204-205-k-dark');
    expect(figureName('µ')).toBe('figure');
  });

  it('gives the scale error of a capture coefficient, and none where it is not known', () => {
    expect(
      scaleErrorOf({ kind: 'capture-rate', gammaCm3PerS: 2e-6, gammaSigmaCm3PerS: 4e-7 }),
    ).toBeCloseTo(0.2, 12);
    expect(
      scaleErrorOf({ kind: 'capture-rate', gammaCm3PerS: 2e-6, gammaSigmaCm3PerS: null }),
    ).toBeNull();
    expect(scaleErrorOf({ kind: 'two-level' })).toBeNull();
  });

  it('hands on the words of a refusal, and says so when the server gave none', () => {
    const refusal = refusalOf(
      {
        error: {
          code: 'invalid',
          message: 'χ² differs.',
          fields: { name: 'Name: write something here.' },
        },
      },
      422,
    );
    expect(refusal).toMatchObject({
      code: 'invalid',
      message: 'χ² differs.',
      fields: { name: 'Name: write something here.' },
    });
    expect(refusalOf('<html>', 502).message).toMatch(/status 502 and no reason/);
  });
});
