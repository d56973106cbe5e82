import Link from 'next/link';

import { FIT_STATES, type FitRow } from '@/lib/schemas/fit';

const WORDS: Record<FitRow['state'], string> = {
  draft: 'Drafts',
  submitted: 'In review',
  accepted: 'Accepted',
  returned: 'Returned',
};

/** The states of a fit as links, each with how many there are. */
export function FitFilter({
  fits,
  state,
}: {
  fits: readonly FitRow[];
  state: FitRow['state'] | null;
}) {
  const count = (wanted: FitRow['state']) => fits.filter((fit) => fit.state === wanted).length;
  const choices = [
    { state: null, label: 'All', href: '/fits', count: fits.length },
    ...FIT_STATES.map((one) => ({
      state: one,
      label: WORDS[one],
      href: `/fits?state=${one}`,
      count: count(one),
    })),
  ];
  return (
    <nav aria-label="State of the fits" className="pt-4 pb-3">
      <ul className="flex flex-wrap gap-x-5 gap-y-1 text-sm">
        {choices.map((choice) => (
          <li key={choice.label}>
            <Link
              href={choice.href}
              aria-current={choice.state === state ? 'true' : undefined}
              className="inline-block border-b-2 border-transparent py-1 text-ink-2 hover:text-ink aria-[current]:border-coral aria-[current]:font-semibold aria-[current]:text-ink"
            >
              {choice.label} <span className="figures font-normal text-ink-3">{choice.count}</span>
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
