import { formatProbability, withDecimals } from '@/lib/format';

import type { WidthTest } from './data-sentence';

/** The zero-width test of each nested pair, with its recipe. */
export function WidthTests({ tests }: { tests: readonly WidthTest[] }) {
  if (tests.length === 0) return null;
  return (
    <div className="grid gap-2 text-sm text-ink-2">
      {tests.map(({ sharp, graded, statistic, pValue, sigmas }) => (
        <p key={`${sharp.id}-${graded.id}`}>
          <strong className="font-semibold text-ink">Zero-width test.</strong> From “{sharp.name}”
          to “{graded.name}” χ² falls by{' '}
          <span className="figures">{withDecimals(statistic, 2)}</span>; the chance of such a fall
          with a sharp edge is <span className="figures">{formatProbability(pValue)}</span> (
          <span className="figures">{withDecimals(sigmas, 1)}σ</span>).
        </p>
      ))}
      <p className="text-[0.8125rem] text-ink-3">
        A width of zero lies on its bound, so the fall of χ² follows ½χ²₀ + ½χ²₁ (Self and Liang
        1987).
      </p>
    </div>
  );
}
