import type { ReactNode } from 'react';

import { cn } from './cn';

type EmptyStateProps = {
  title: ReactNode;
  /** What to do first. */
  text?: ReactNode;
  action?: ReactNode;
  className?: string;
};

export function EmptyState({ title, text, action, className }: EmptyStateProps) {
  return (
    <div
      className={cn(
        'grid prose-measure justify-items-start gap-2 border-t border-rule py-8',
        className,
      )}
    >
      <p className="font-serif text-lg font-semibold">{title}</p>
      {text && <div className="grid gap-2 text-ink-2">{text}</div>}
      {action && <div className="mt-2 flex flex-wrap gap-2">{action}</div>}
    </div>
  );
}
