import { describe, expect, it } from 'vitest';

import { isCurrent, NAV_ITEMS } from '@/components/shell/nav-items';

const currentAt = (pathname: string) =>
  NAV_ITEMS.filter((item) => isCurrent(item, pathname)).map((item) => item.label);

describe('the current section', () => {
  it.each([
    ['/', []],
    ['/samples', ['Samples']],
    ['/samples/new', ['Samples']],
    ['/scans/new', ['Samples']],
    ['/stopping/new', ['Stopping sets']],
    ['/compare', ['Fits']],
    ['/fits/new', ['Fits']],
    ['/reviews/1', ['Reviews']],
    ['/profiles', ['Issued profiles']],
    ['/profilesque', []],
    ['/account/sessions', []],
  ])('at %s is %j', (pathname, labels) => {
    expect(currentAt(pathname)).toEqual(labels);
  });
});
