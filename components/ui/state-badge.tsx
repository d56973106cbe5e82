import { cn } from './cn';

export type BadgeState = 'draft' | 'submitted' | 'accepted' | 'returned' | 'archived';

const LOOKS: Record<BadgeState, { word: string; colour: string; path: string; filled?: boolean }> =
  {
    draft: {
      word: 'draft',
      colour: 'text-amber',
      path: 'M6 1.5a4.5 4.5 0 1 0 0 9 4.5 4.5 0 0 0 0-9',
    },
    submitted: { word: 'in review', colour: 'text-tide', path: 'M1 6h9M6.5 2.5L10 6l-3.5 3.5' },
    accepted: { word: 'accepted', colour: 'text-kelp', path: 'M1.5 6.5l3 3 6-7' },
    returned: {
      word: 'returned',
      colour: 'text-coral-ink',
      path: 'M4.5 2L1.5 5l3 3M1.5 5h6a2.7 2.7 0 0 1 0 5.4H5',
    },
    archived: {
      word: 'archived',
      colour: 'text-ink-3',
      path: 'M1.5 2.5h9v2h-9zM2.5 4.5v5.5h7V4.5M5 7h2',
    },
  };

/** Where a fit stands in its life: a mark and a word, never colour alone. */
export function StateBadge({ state, className }: { state: BadgeState; className?: string }) {
  const look = LOOKS[state];
  return (
    <span
      className={cn(
        'inline-flex items-center gap-1.5 rounded-full border border-current px-2 py-px font-sans text-xs font-medium whitespace-nowrap',
        look.colour,
        className,
      )}
    >
      <svg
        aria-hidden="true"
        viewBox="0 0 12 12"
        className="size-2.5 fill-none stroke-current stroke-[1.6]"
      >
        <path d={look.path} />
      </svg>
      {look.word}
    </span>
  );
}
