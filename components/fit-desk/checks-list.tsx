import { memo } from 'react';

import { Mark } from '@/components/ui/mark';
import type { Check } from '@/lib/inversion/index';

const WORDS = { problem: 'Problem', caution: 'Caution', fine: 'Fine' } as const;
/** How many sentences stand open; all that need attention always do. */
const MOST_AT_ONCE = 3;
const RANK = { problem: 0, caution: 1, fine: 2 } as const;

/**
 * Checks in words; what needs attention first, what is fine folded away behind its number. Not drawn
 * anew while a handle moves.
 */
export const ChecksList = memo(function ChecksList({
  checks,
  outOfDate,
}: {
  checks: readonly Check[];
  outOfDate: boolean;
}) {
  const attention = checks
    .filter((check) => check.state !== 'fine')
    .sort((a, b) => RANK[a.state] - RANK[b.state]);
  const fine = checks.filter((check) => check.state === 'fine');
  const shown = Math.max(0, MOST_AT_ONCE - attention.length);
  return (
    <section aria-labelledby="checks-heading">
      <h2 id="checks-heading" className="mb-2 text-sm text-ink-2">
        Checks{outOfDate && <span className="font-normal text-ink-3"> (of the last fit)</span>}
      </h2>
      {checks.length === 0 && <p className="text-sm text-ink-3">They come with the fit.</p>}
      <Sentences checks={[...attention, ...fine.slice(0, shown)]} />
      {fine.length > shown && (
        <details className="mt-2.5">
          <summary className="text-sm text-ink-2">
            {fine.length - shown}{' '}
            {shown > 0 || attention.length > 0 ? 'more are fine' : 'checks are fine'}
          </summary>
          <div className="mt-2.5">
            <Sentences checks={fine.slice(shown)} />
          </div>
        </details>
      )}
    </section>
  );
});

function Sentences({ checks }: { checks: readonly Check[] }) {
  return (
    <ul className="grid gap-2.5">
      {checks.map((check) => (
        <li key={check.id} id={`check-${check.id}`} className="flex gap-2 text-sm">
          <Mark kind={check.state} className="mt-0.5" />
          <span>
            <span className="sr-only">{WORDS[check.state]}: </span>
            {check.message}
          </span>
        </li>
      ))}
    </ul>
  );
}
