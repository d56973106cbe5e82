import { describe, expect, it } from 'vitest';

import { poolSize, workersFor } from '@/workers/pool-size';

import { gaussianSet } from './worked-scan';

describe('size of the pool', () => {
  it('follows the cores, from one to eight', () => {
    expect([undefined, 0, 1, 2, 7, 8, 64].map(poolSize)).toEqual([1, 1, 1, 2, 7, 8, 8]);
  });

  it('uses fewer workers for a stopping set that would fill the memory', () => {
    expect(workersFor(8, gaussianSet())).toBe(8);
    const huge = {
      profiles: [
        {
          energyKeV: 1,
          edgesNm: new Float64Array(10),
          mass: new Float64Array(12_000_000),
          lostShare: null,
          interpolatedBetween: null,
        },
      ],
    };
    expect(workersFor(8, huge)).toBe(2);
  });
});
