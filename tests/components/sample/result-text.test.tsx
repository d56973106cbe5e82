import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { ResultText } from '@/components/sample/result-text';
import type { FitRow } from '@/lib/schemas/fit';

type Parameter = NonNullable<FitRow['edge']>;

const EDGE: Parameter = {
  name: 'edgeDepthNm',
  value: 78.412,
  sigma: 2,
  interval68: [76.51, 80.52],
  interval95: [74.6, 82.9],
  held: false,
  atBound: null,
  symmetric: true,
};

const textOf = (parameter: FitRow['edge'], quantity: 'depth' | 'width' = 'depth') =>
  render(<ResultText of={parameter} quantity={quantity} />).container.textContent;

/** The ways to write a result are those of the design: 78.4 +2.1 −1.9 nm, "deeper than 112 nm (95 %)". */
describe('ResultText', () => {
  it('writes both sides of an interval', () => {
    expect(textOf(EDGE)).toBe('78.4 +2.1 −1.9 nm');
  });

  it('says a one-sided depth in words, at 95 %', () => {
    const open: Parameter = {
      ...EDGE,
      value: 130,
      sigma: null,
      interval68: [118, null],
      interval95: [112, null],
    };
    expect(textOf(open)).toBe('deeper than 112 nm (95 %)');
  });

  it('has words of its own for a width', () => {
    const open: Parameter = {
      ...EDGE,
      name: 'edgeWidthNm',
      value: 3,
      sigma: null,
      interval68: [null, 9],
      interval95: [null, 14],
    };
    expect(textOf(open, 'width')).toBe('narrower than 14.0 nm (95 %)');
  });

  it('says when a value was held, and a dash when there is none', () => {
    expect(textOf({ ...EDGE, value: 80, sigma: null, held: true })).toBe('80.0 nm, held');
    expect(textOf(null)).toBe('–');
  });
});
