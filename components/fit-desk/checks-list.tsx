import { Mark } from '@/components/ui/mark';
import type { Check } from '@/lib/inversion/index';

const WORDS = { problem: 'Problem', caution: 'Caution', fine: 'Fine' } as const;
const RANK = { problem: 0, caution: 1, fine: 2 } as const;

/** Checks in words; what needs attention first, what is fine folded away behind its number. */
export function ChecksList({
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
  return (
    <section aria-labelledby="checks-heading">
      <h2 id="checks-heading" className="mb-2 text-sm text-ink-2">
        Checks{outOfDate && <span className="font-normal text-ink-3"> (of the last fit)</span>}
      </h2>
      {checks.length === 0 && <p className="text-sm text-ink-3">They come with the fit.</p>}
      <Sentences checks={attention} />
      {fine.length > 0 && (
        <details className="mt-2" open={attention.length < 3}>
          <summary className="text-sm text-ink-2">
            {fine.length === 1 ? '1 check is fine' : `${fine.length} checks are fine`}
          </summary>
          <div className="mt-2">
            <Sentences checks={fine} />
          </div>
        </details>
      )}
    </section>
  );
}

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
