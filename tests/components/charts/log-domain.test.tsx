import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { decades, logDomain } from '@/components/charts/log-domain';

describe('domain of a log axis', () => {
  it('never holds zero or less, whatever it is given', () => {
    const values = fc.array(
      fc.oneof(fc.constant(null), fc.double({ noNaN: false }), fc.constant(0)),
    );
    fc.assert(
      fc.property(values, (list) => {
        const [low, high] = logDomain(list);
        expect(low).toBeGreaterThan(0);
        expect(high).toBeGreaterThan(low);
      }),
    );
  });

  it('goes in whole decades round the values', () => {
    expect(logDomain([3e12, 6.2e15])).toEqual([1e12, 1e16]);
  });

  it('ends a decade below the floor, where values can no longer be told apart', () => {
    expect(logDomain([1e3, 6.2e15], 8e13)).toEqual([1e12, 1e16]);
  });

  it('shows six decades at the most', () => {
    expect(logDomain([1, 6.2e15])).toEqual([1e10, 1e16]);
  });
});

describe('decades', () => {
  it('are thinned to what fits', () => {
    expect(decades([1e12, 1e16])).toEqual([12, 13, 14, 15, 16]);
    expect(decades([1, 1e12], 5)).toEqual([0, 3, 6, 9, 12]);
  });
});
