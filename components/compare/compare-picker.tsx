import Link from 'next/link';

import { StateBadge } from '@/components/ui/state-badge';
import type { FitRow } from '@/lib/schemas/fit';

import { compareAddress, MOST_FITS, withFirst, without } from './compare-address';
import { fitMark } from './fit-mark';
import { MarkSample } from './mark-sample';

const quiet = 'text-link min-h-6 inline-flex items-center whitespace-nowrap text-[0.8125rem]';

/** The fits shown and the others of the same scan. Every choice is a link: the address holds the comparison. */
export function ComparePicker({
  shown,
  others,
}: {
  shown: readonly FitRow[];
  others: readonly FitRow[];
}) {
  const ids = shown.map((fit) => fit.id);
  return (
    <section aria-labelledby="picker" className="grid gap-4">
      <h2 id="picker" className="text-sm font-semibold text-ink-2">
        Fits compared
      </h2>
      <ol className="grid border-t border-rule">
        {shown.map((fit, index) => (
          <li
            key={fit.id}
            className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-rule py-2"
          >
            <MarkSample mark={fitMark(index)} />
            <FitName fit={fit} />
            <span className="no-print ml-auto flex flex-wrap gap-x-4">
              {index > 0 && (
                <Link
                  className={quiet}
                  scroll={false}
                  href={compareAddress(withFirst(ids, fit.id))}
                  aria-label={`Put ${fit.name} first`}
                >
                  put first
                </Link>
              )}
              <Link
                className={quiet}
                scroll={false}
                href={compareAddress(without(ids, fit.id))}
                aria-label={`Take ${fit.name} out of the comparison`}
              >
                take out
              </Link>
            </span>
          </li>
        ))}
      </ol>
      <Others ids={ids} others={others} />
    </section>
  );
}

function Others({ ids, others }: { ids: readonly string[]; others: readonly FitRow[] }) {
  if (others.length === 0) {
    return (
      <p className="text-[0.8125rem] text-ink-3">This scan has no other fit to compare with.</p>
    );
  }
  if (ids.length >= MOST_FITS) {
    return (
      <p className="text-[0.8125rem] text-ink-3">
        {MOST_FITS} fits are the most that one comparison takes. Take one out to add another.
      </p>
    );
  }
  return (
    <div className="no-print grid gap-1">
      <h3 className="text-[0.8125rem] text-ink-3">Other fits of this scan</h3>
      <ul className="grid">
        {others.map((fit) => (
          <li key={fit.id} className="flex flex-wrap items-center gap-x-3 gap-y-1 py-1.5">
            <FitName fit={fit} />
            <Link
              className={`${quiet} ml-auto`}
              scroll={false}
              href={compareAddress([...ids, fit.id])}
              aria-label={`Add ${fit.name} to the comparison`}
            >
              add
            </Link>
          </li>
        ))}
      </ul>
    </div>
  );
}

function FitName({ fit }: { fit: FitRow }) {
  return (
    <span className="flex min-w-0 flex-wrap items-center gap-x-2 gap-y-1">
      <Link href={`/fits/${fit.id}`} className="font-medium text-link">
        {fit.name}
      </Link>
      <StateBadge state={fit.state} />
      <span className="text-[0.8125rem] text-ink-3">
        {fit.profile} edge, {fit.createdBy}
      </span>
    </span>
  );
}
