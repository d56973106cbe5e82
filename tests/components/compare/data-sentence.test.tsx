import { describe, expect, it } from 'vitest';

import { dataSentences } from '@/components/compare/data-sentence';

import { makeFit } from '../review/make-fit';

const sharp = makeFit({ name: 'Sharp', spec: { profile: 'sharp' } });
const graded = makeFit({ name: 'Graded' });
const yes = { comparable: true } as const;
const evidence = (...deltas: (number | null)[]) =>
  deltas.map((deltaAicc, i) => ({ label: String(i), deltaAicc }));

describe('what the data say', () => {
  it('says plainly that a graded edge is not told from a sharp one', () => {
    const test = { sharp, graded, statistic: 0.8, pValue: 0.19, sigmas: 0.9 };
    expect(dataSentences([sharp, graded], yes, evidence(0, 1.9), [test])).toEqual([
      'The data do not tell a graded edge from a sharp one: a width lowers χ² by only 0.8, no more than chance would (p = 0.19).',
    ]);
  });

  it('names the pairs where there are several', () => {
    const test = { sharp, graded, statistic: 0.8, pValue: 0.19, sigmas: 0.9 };
    const said = dataSentences([sharp, graded, makeFit()], yes, evidence(0, 1.9, 3), [test, test]);
    expect(said[0]).toMatch(/^“Graded” against “Sharp”: The data do not tell/);
  });

  it('tells favour from rejection at three sigma', () => {
    const test = (statistic: number, pValue: number, sigmas: number) =>
      dataSentences([sharp, graded], yes, evidence(5, 0), [
        { sharp, graded, statistic, pValue, sigmas },
      ])[0];
    expect(test(6.7, 0.0048, 2.6)).toBe(
      'The data favour a graded edge, without settling it: a width lowers χ² by 6.7, so zero width is rejected at 2.6σ (p = 0.0048).',
    );
    expect(test(14, 9.1e-5, 3.7)).toBe(
      'The data reject a sharp edge: a width lowers χ² by 14.0, so zero width is rejected at 3.7σ (p below 0.0001).',
    );
  });

  it('ranks other models by AICc, in words for the size of the gap', () => {
    const said = (gap: number) =>
      dataSentences([graded, makeFit({ name: 'Held level' })], yes, evidence(0, gap), [])[0];
    expect(said(1.3)).toBe('The data do not choose between “Graded” and “Held level” (ΔAICc 1.3).');
    expect(said(4.5)).toBe('The data lean towards “Graded” over “Held level” (ΔAICc 4.5).');
    expect(said(12)).toBe('The data clearly favour “Graded” over “Held level” (ΔAICc 12.0).');
  });

  it('does not rank what AICc cannot rank', () => {
    expect(dataSentences([graded, makeFit()], yes, evidence(null, null), [])[0]).toContain(
      'too few points for AICc',
    );
  });

  it('says first that none of them fits', () => {
    const poor = (name: string) => makeFit({ name, answer: { pValue: 0.0002 } });
    expect(dataSentences([poor('A'), poor('B')], yes, evidence(0, 3), [])[0]).toMatch(
      /^None of these fits describes the scan/,
    );
    expect(dataSentences([poor('A'), graded], yes, evidence(0, 3), [])[0]).not.toMatch(/^None/);
  });

  it('refuses to weigh different points', () => {
    const said = dataSentences(
      [graded, sharp],
      { comparable: false, reason: 'They hold different points.' },
      [],
      [],
    );
    expect(said[0]).toBe(
      'These fits cannot be weighed against each other. They hold different points.',
    );
  });

  it('warns of differing priors', () => {
    const prior = {
      held: false,
      value: null,
      prior: { mean: 0.3, sigma: 0.02 },
      origin: 'bulk run',
    };
    const other = makeFit({ spec: { parameters: { levelBulk: prior } } });
    expect(dataSentences([graded, other], yes, evidence(0, 3), []).at(-1)).toMatch(
      /^Their priors differ/,
    );
  });
});
