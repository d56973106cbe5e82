import { useId, type ReactNode } from 'react';

import { cn } from './cn';

type SectionProps = {
  title: ReactNode;
  /** InventedMark and the like, behind the title. */
  badge?: ReactNode;
  /** Links or buttons at the end of the title's line. */
  actions?: ReactNode;
  id?: string;
  className?: string;
  children: ReactNode;
};

/** A part of a page under its own small heading. */
export function Section({ title, badge, actions, id, className, children }: SectionProps) {
  const headingId = useId();
  return (
    <section
      id={id}
      aria-labelledby={headingId}
      className={cn('grid min-w-0 content-start gap-3 pt-7', className)}
    >
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
        <div className="flex flex-wrap items-center gap-x-2.5">
          <h2 id={headingId}>{title}</h2>
          {badge}
        </div>
        {actions && (
          <div className="no-print flex flex-wrap items-center gap-2 text-sm">{actions}</div>
        )}
      </div>
      {children}
    </section>
  );
}
