import { expect, it } from 'vitest';

import { bandSentences } from '@/components/compare/band-sentences';
import { fitMark } from '@/components/compare/fit-mark';

import { makeFit } from '../review/make-fit';

const base = makeFit();
const marks = [0, 1, 2].map(fitMark);
const changed = (change: Partial<typeof base.carrierProfile>) =>
  makeFit({ carrierProfile: { ...base.carrierProfile, ...change } });

it('names the pair and the depths where 95 % bands part', () => {
  const doubled = changed({
    points: base.carrierProfile.points.map((point) => ({
      ...point,
      lower95: (point.lower95 ?? 0) * 2,
      upper95: (point.upper95 ?? 0) * 2,
    })),
  });
  expect(bandSentences([base, makeFit(), doubled], marks)).toEqual([
    'The 95 % bands of A and C do not meet from 80.0 to 120 nm.',
    'The 95 % bands of B and C do not meet from 80.0 to 120 nm.',
  ]);
});

it('says why two profiles cannot be held against each other', () => {
  expect(bandSentences([base, changed({ bands: null })], marks)).toEqual([
    'The profiles of A and B cannot be held against each other: one of them has no bands.',
  ]);
  expect(bandSentences([base, changed({ unit: 'populated share' })], marks)[0]).toMatch(
    /one is a populated share, the other a concentration\.$/,
  );
});
