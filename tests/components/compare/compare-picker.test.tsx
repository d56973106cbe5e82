import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';

import { compareAddress, idsInAddress, MOST_FITS } from '@/components/compare/compare-address';
import { ComparePicker } from '@/components/compare/compare-picker';
import { compareFitsSchema } from '@/lib/schemas/fit';

import { makeFit } from '../review/make-fit';

afterEach(cleanup);

const href = (name: string) => screen.getByRole('link', { name }).getAttribute('href');

describe('the address of a comparison', () => {
  it('keeps order and drops blanks and repeats', () => {
    expect(idsInAddress('b, a,,b')).toEqual(['b', 'a']);
    expect(idsInAddress(['b', 'a,c'])).toEqual(['b', 'a', 'c']);
    expect(idsInAddress(undefined)).toEqual([]);
  });

  it('takes as many fits as the server does', () => {
    const ids = (count: number) => Array.from({ length: count }, () => makeFit().id);
    expect(compareFitsSchema.safeParse({ ids: ids(MOST_FITS) }).success).toBe(true);
    expect(compareFitsSchema.safeParse({ ids: ids(MOST_FITS + 1) }).success).toBe(false);
  });
});

describe('picking', () => {
  const [a, b, c] = [
    makeFit({ name: 'One' }),
    makeFit({ name: 'Two' }),
    makeFit({ name: 'Three' }),
  ];

  it('adds, takes out and puts first by links', () => {
    render(<ComparePicker shown={[a, b]} others={[c]} />);
    expect(href('Add Three to the comparison')).toBe(compareAddress([a.id, b.id, c.id]));
    expect(href('Take One out of the comparison')).toBe(compareAddress([b.id]));
    expect(href('Put Two first')).toBe(compareAddress([b.id, a.id]));
    expect(screen.queryByRole('link', { name: 'Put One first' })).toBeNull();
  });

  it('adds no ninth fit', () => {
    const eight = Array.from({ length: MOST_FITS }, () => makeFit());
    render(<ComparePicker shown={eight} others={[c]} />);
    expect(screen.queryByRole('link', { name: /^Add/ })).toBeNull();
    expect(screen.getByText(/8 fits are the most/)).toBeTruthy();
  });
});
