import { describe, expect, it } from 'vitest';

import { mergeBlocks, splitIntoBlocks } from '@/workers/blocks';

describe('splitting resamples into blocks', () => {
  it('covers every row once, in order, with a shorter last block', () => {
    const blocks = splitIntoBlocks(110, 3, 25);
    expect(blocks.map(({ first, count }) => [first, count])).toEqual([
      [0, 25],
      [25, 25],
      [50, 25],
      [75, 25],
      [100, 10],
    ]);
    expect(blocks.every(({ seed }) => seed === 3)).toBe(true);
  });

  it('gives no block for nothing', () => expect(splitIntoBlocks(0, 1)).toEqual([]));
});

describe('merging blocks', () => {
  const part = (first: number, ...rows: number[]) => ({
    first,
    count: rows.length / 2,
    rows: Float64Array.from(rows),
  });

  it('puts rows in order whatever order they came in', () => {
    const parts = [part(2, 20, 21), part(0, 0, 1, 10, 11)];
    expect(Array.from(mergeBlocks(parts, 3))).toEqual([0, 1, 10, 11, 20, 21]);
  });

  it('refuses when a block is missing', () => {
    expect(() => mergeBlocks([part(0, 0, 1)], 3)).toThrow('1 of 3 rows came back');
  });

  it('refuses a block of another width', () => {
    expect(() =>
      mergeBlocks([part(0, 0, 1), { first: 1, count: 1, rows: Float64Array.from([1, 2, 3]) }], 2),
    ).toThrow('not 2 wide');
  });
});
