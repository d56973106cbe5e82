import { compareFits, zeroWidthTest } from '@/lib/inversion/index';
import type { Fit } from '@/lib/schemas/fit';

import type { CompareEvidenceRow } from './compare-evidence';
import { comparability, type Comparability } from './comparability';
import { dataSentences, type WidthTest } from './data-sentence';
import { fitMark } from './fit-mark';
import { nestedPairs } from './same-model';

export interface WeighedFits {
  judged: Comparability;
  rows: CompareEvidenceRow[];
  tests: WidthTest[];
  /** What the data say, the answer first. */
  sentences: string[];
}

/** Evidence of fits of one scan, the tests of nested pairs among them, and the sentences they add up to. */
export function weighFits(fits: readonly Fit[]): WeighedFits {
  const compared = compareFits(
    fits.map((fit, index) => ({ label: fitMark(index).letter, answer: fit.answer })),
  );
  const ours = comparability(fits);
  const judged: Comparability =
    ours.comparable && !compared.comparable
      ? { comparable: false, reason: compared.reason ?? 'Their points differ.' }
      : ours;
  const rows = compared.rows.map((row, index): CompareEvidenceRow => {
    const fit = fits[index]!;
    return {
      ...row,
      mark: fitMark(index),
      name: fit.name,
      degreesOfFreedom: fit.answer.degreesOfFreedom,
      pValue: fit.answer.pValue,
    };
  });
  const tests = nestedPairs(fits).map(({ sharp, graded }) => ({
    sharp,
    graded,
    ...zeroWidthTest(sharp.answer, graded.answer),
  }));
  return { judged, rows, tests, sentences: dataSentences(fits, judged, rows, tests) };
}
