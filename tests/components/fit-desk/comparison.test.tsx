import { describe, expect, it } from 'vitest';

import {
  evidenceRows,
  zeroWidthSentence,
  type ComparedFit,
} from '@/components/fit-desk/comparison';
import { profileSeries, residualSeries } from '@/components/fit-desk/profile-series';
import { carrierProfile, fit, prepareFit, type ProfileKind } from '@/lib/inversion/index';

import { workedInput } from '../../workers/worked-scan';

function fitted(kind: ProfileKind): ComparedFit {
  const input = workedInput({ profile: kind });
  const prepared = prepareFit(input);
  const outcome = fit(prepared);
  if (outcome.status === 'no-minimum') throw new Error(outcome.reason);
  return { kind, input, answer: outcome.answer, profile: carrierProfile(prepared, outcome.answer) };
}

const [sharp, graded] = [fitted('sharp'), fitted('graded')];

describe('comparison of trial profiles', () => {
  it('weighs them so that the weights sum to 1, the model on the desk solid', () => {
    const { rows, reason } = evidenceRows([sharp, graded], 'graded');
    expect(reason).toBeNull();
    expect(rows.reduce((sum, { weight }) => sum + (weight ?? 0), 0)).toBeCloseTo(1, 12);
    expect(rows.map(({ label, dashed }) => [label, dashed])).toEqual([
      ['Sharp edge', true],
      ['Graded edge', false],
    ]);
  });

  it('tests zero width against the half-half mixture (Self and Liang 1987): σ is the root of the χ² difference', () => {
    const sigmas = Math.sqrt(Math.max(0, sharp.answer.chiSquare - graded.answer.chiSquare));
    expect(zeroWidthSentence([sharp, graded])).toContain(`${sigmas.toFixed(1)} σ, p = `);
    expect(zeroWidthSentence([graded])).toBeNull();
  });

  it('rejects zero width only below p = 0.05', () => {
    const clearer = {
      ...sharp,
      answer: { ...sharp.answer, chiSquare: graded.answer.chiSquare + 9 },
    };
    const same = { ...sharp, answer: { ...sharp.answer, chiSquare: graded.answer.chiSquare } };
    expect(zeroWidthSentence([clearer, graded])).toMatch(
      /^Zero width is rejected \(3\.0 σ, p = 0\.0013/,
    );
    expect(zeroWidthSentence([same, graded])).toMatch(/^These data do not tell/);
  });
});

describe('what the figures draw of a comparison', () => {
  it('has the fit first and solid, the others dashed, never the same model twice', () => {
    const main = { kind: 'graded' as const, profile: graded.profile, answer: graded.answer };
    expect(profileSeries(main, [sharp, graded]).map(({ label, style }) => [label, style])).toEqual([
      ['graded', 'solid'],
      ['sharp', 'dashed'],
    ]);
    expect(residualSeries(main, [sharp, graded])).toHaveLength(2);
    expect(profileSeries(null, [sharp])).toEqual([]);
  });

  it('leaves out a profile in another unit', () => {
    const main = {
      kind: 'graded' as const,
      profile: { ...graded.profile, unit: 'populated share' as const },
    };
    expect(profileSeries(main, [sharp])).toHaveLength(1);
  });
});
