import { cn } from './cn';

export type MarkKind = 'fine' | 'information' | 'caution' | 'problem';

const COLOURS: Record<MarkKind, string> = {
  fine: 'text-kelp',
  information: 'text-tide',
  caution: 'text-amber',
  problem: 'text-coral-ink',
};

/** The sign beside a sentence. Each has a shape of its own: round tick, round i, triangle, square. */
export function Mark({ kind, className }: { kind: MarkKind; className?: string }) {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 16 16"
      className={cn('size-4 shrink-0 fill-current', COLOURS[kind], className)}
    >
      {kind === 'fine' && (
        <>
          <circle cx="8" cy="8" r="8" />
          <path d="M4.6 8.3l2.3 2.4 4.6-5" className="fill-none stroke-paper" strokeWidth="1.8" />
        </>
      )}
      {kind === 'information' && (
        <>
          <circle cx="8" cy="8" r="7.1" fill="none" stroke="currentColor" strokeWidth="1.8" />
          <path d="M7 7h2v5H7zM7 4h2v2H7z" />
        </>
      )}
      {kind === 'caution' && (
        <>
          <path d="M8 .6L16 15H0z" />
          <path d="M7.1 5.5h1.8v5H7.1zM7.1 11.6h1.8v1.8H7.1z" className="fill-paper" />
        </>
      )}
      {kind === 'problem' && (
        <>
          <rect width="16" height="16" rx="2" />
          <path d="M4.5 4.5l7 7m0-7l-7 7" className="fill-none stroke-paper" strokeWidth="1.8" />
        </>
      )}
    </svg>
  );
}
