import { significant } from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';

import { bandsApart, pairs, type DepthRange } from './disagreements';
import type { FitMark } from './fit-mark';

/** One sentence for each pair of profiles whose 95 % bands part somewhere within their reach. */
export function bandSentences(fits: readonly Fit[], marks: readonly FitMark[]): string[] {
  return pairs(fits.length).flatMap(([first, second]) => {
    const names = `${marks[first]?.letter} and ${marks[second]?.letter}`;
    const ranges = bandsApart(fits[first]!, fits[second]!);
    if (ranges === null)
      return [
        `The profiles of ${names} cannot be held against each other: ${why(fits[first]!, fits[second]!)}.`,
      ];
    if (ranges.length === 0) return [];
    return [`The 95 % bands of ${names} do not meet ${ranges.map(rangeWords).join(' and ')}.`];
  });
}

function why(a: Fit, b: Fit): string {
  return a.carrierProfile.unit !== b.carrierProfile.unit
    ? 'one is a populated share, the other a concentration'
    : 'one of them has no bands';
}

function rangeWords({ fromNm, toNm }: DepthRange): string {
  return fromNm === toNm
    ? `at ${significant(fromNm)} nm`
    : `from ${significant(fromNm)} to ${significant(toNm)} nm`;
}
