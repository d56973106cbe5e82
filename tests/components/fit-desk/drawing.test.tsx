import { describe, expect, it } from 'vitest';

import {
  arrowStep,
  asDrawn,
  drawnChiSquare,
  movedByKey,
  valuesToDraw,
} from '@/components/fit-desk/drawn-values';

const points = [2, 6, 10].map((energyKeV, index) => ({
  energyKeV,
  value: [0.7, 0.6, 0.4][index]!,
  sigma: 0.1,
  enabled: energyKeV !== 6,
}));

describe('values to draw with', () => {
  const names = ['edgeDepthNm', 'edgeWidthNm', 'levelTop', 'levelBulk', 'depthScale'] as const;

  it('prefers what was drawn, then held, then fitted, then a guess from the points in use', () => {
    const values = valuesToDraw({
      names,
      fitted: { edgeDepthNm: 78, levelTop: 0.74, levelBulk: 0.3 },
      held: { levelTop: 0.7, depthScale: 1 },
      points,
      deepestNm: 200,
      drawn: { edgeDepthNm: 90 },
    });
    expect(values).toEqual({
      edgeDepthNm: 90,
      edgeWidthNm: 10,
      levelTop: 0.7,
      levelBulk: 0.3,
      depthScale: 1,
    });
  });

  it('can draw before anything was fitted', () => {
    const values = valuesToDraw({ names, fitted: {}, held: {}, points, deepestNm: 210, drawn: {} });
    expect(values).toMatchObject({ edgeDepthNm: 70, levelTop: 0.7, levelBulk: 0.4 });
  });
});

describe('an arrow key', () => {
  it('moves by a tenth of the 68 % interval', () => {
    expect(arrowStep({ interval68: [76, 81], sigma: 2 }, 200)).toBeCloseTo(0.5, 12);
  });

  it('moves by a fifth of σ where the interval is open, and by a hundredth of the range without either', () => {
    expect(arrowStep({ interval68: [76, null], sigma: 2 }, 200)).toBeCloseTo(0.4, 12);
    expect(arrowStep(null, 200)).toBe(2);
    expect(arrowStep({ interval68: [null, null], sigma: null }, 200)).toBe(2);
  });

  it('stays inside the range, and Home and End go to its ends', () => {
    const range = { step: 5, min: 0, max: 100 };
    expect(movedByKey('ArrowRight', 98, range)).toBe(100);
    expect(movedByKey('ArrowLeft', 98, range)).toBe(93);
    expect(movedByKey('PageDown', 98, range)).toBe(48);
    expect(movedByKey('Home', 98, range)).toBe(0);
    expect(movedByKey('End', 8, range)).toBe(100);
    expect(movedByKey('Enter', 8, range)).toBeNull();
  });
});

describe('what is drawn by hand', () => {
  it('has χ² over the points in use alone', () => {
    expect(drawnChiSquare(points, [0.8, 99, 0.2])).toBeCloseTo(1 + 4, 12);
  });

  it('keeps four digits', () => expect(asDrawn(112.66534589988716)).toBe(112.7));
});
