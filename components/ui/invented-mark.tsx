import { cn } from './cn';

/** Goes wherever numbers of the demo generator show. */
export function InventedMark({ className }: { className?: string }) {
  return (
    <span
      title="These numbers come from a generator with a seed. Nobody measured them."
      className={cn(
        'inline-flex items-center rounded-[3px] border border-dashed border-ink-3 px-1.5 py-px font-sans text-xs font-normal whitespace-nowrap text-ink-2',
        className,
      )}
    >
      invented data
    </span>
  );
}
