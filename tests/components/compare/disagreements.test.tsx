import { describe, expect, it } from 'vitest';

import {
  bandsApart,
  intervalsMeet,
  pairs,
  rangesWhere,
  resultDisagreements,
} from '@/components/compare/disagreements';

import { makeFit, makeParameter } from '../review/make-fit';

const withEdge = (value: number, half: number, changes = {}) =>
  makeFit({ answer: { parameters: [makeParameter('edgeDepthNm', value, half, changes)] } });

describe('results that differ by more than their intervals', () => {
  it('is silent while the 68 % intervals meet', () => {
    expect(resultDisagreements([withEdge(78, 2), withEdge(81.9, 2)])).toEqual([]);
  });

  it('tells beyond 68 % from beyond 95 %', () => {
    expect(resultDisagreements([withEdge(78, 2), withEdge(83, 2), withEdge(95, 2)])).toEqual([
      { name: 'edgeDepthNm', first: 0, second: 1, verdict: 'beyond 68 %' },
      { name: 'edgeDepthNm', first: 0, second: 2, verdict: 'beyond 95 %' },
      { name: 'edgeDepthNm', first: 1, second: 2, verdict: 'beyond 95 %' },
    ]);
  });

  it('lets an open side reach to infinity', () => {
    const deeper = withEdge(150, 5, { interval68: [112, null], interval95: [104, null] });
    expect(resultDisagreements([deeper, withEdge(300, 1)])).toEqual([]);
    expect(resultDisagreements([deeper, withEdge(80, 2)])[0]?.verdict).toBe('beyond 95 %');
  });

  it('takes a held value as a point, and two held values as assumptions', () => {
    const held = (value: number) =>
      withEdge(value, 0, { held: true, interval68: [null, null], interval95: [null, null] });
    expect(resultDisagreements([held(70), withEdge(78, 2)])[0]?.verdict).toBe('beyond 95 %');
    expect(resultDisagreements([held(78.5), withEdge(78, 2)])).toEqual([]);
    expect(resultDisagreements([held(70), held(90)])).toEqual([]);
  });
});

describe('bands that do not meet', () => {
  const base = makeFit();
  const shifted = (factor: number) =>
    makeFit({
      carrierProfile: {
        ...base.carrierProfile,
        points: base.carrierProfile.points.map((point) => ({
          ...point,
          lower95: (point.lower95 ?? 0) * factor,
          upper95: (point.upper95 ?? 0) * factor,
        })),
      },
    });

  it('finds none between equal profiles', () => {
    expect(bandsApart(base, makeFit())).toEqual([]);
  });

  it('finds the depths, and none beyond the reach', () => {
    // 95 % bands at 80 and 120 nm: 0.9…1.2e16 against 1.8…2.4e16; at 160 nm too, but the reach ends at 140.
    expect(bandsApart(base, shifted(2))).toEqual([{ fromNm: 80, toNm: 120 }]);
  });

  it('does not compare shares with concentrations', () => {
    const share = makeFit({ carrierProfile: { ...base.carrierProfile, unit: 'populated share' } });
    expect(bandsApart(base, share)).toBeNull();
  });
});

it('joins neighbouring depths into ranges', () => {
  expect(rangesWhere([0, 1, 2, 3, 4, 5], (depth) => depth !== 2 && depth < 5)).toEqual([
    { fromNm: 0, toNm: 1 },
    { fromNm: 3, toNm: 4 },
  ]);
});

it('pairs every fit with every later one', () => {
  expect(pairs(3)).toEqual([
    [0, 1],
    [0, 2],
    [1, 2],
  ]);
});

it('treats touching intervals as meeting', () => {
  expect(intervalsMeet([1, 2], [2, 3])).toBe(true);
  expect(intervalsMeet([1, 2], [2.1, 3])).toBe(false);
});
