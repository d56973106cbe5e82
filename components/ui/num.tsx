import type { ReactNode } from 'react';

import { cn } from './cn';

type NumProps = {
  /** Behind the number, smaller in rank. */
  unit?: string;
  /** All digits, on hover. */
  title?: string;
  className?: string;
  children: ReactNode;
};

/** A number in the mono with tabular figures, kept on one line with its unit. */
export function Num({ unit, title, className, children }: NumProps) {
  return (
    <span title={title} className={cn('figures whitespace-nowrap', className)}>
      {children}
      {unit && <span className="text-ink-3">&nbsp;{unit}</span>}
    </span>
  );
}
