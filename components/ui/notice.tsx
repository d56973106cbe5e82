import type { ReactNode } from 'react';

import { cn } from './cn';
import { Mark, type MarkKind } from './mark';

const WORDS: Record<MarkKind, string> = {
  fine: 'Fine',
  information: 'Note',
  caution: 'Caution',
  problem: 'Problem',
};
const EDGES: Record<MarkKind, string> = {
  fine: 'border-kelp',
  information: 'border-tide',
  caution: 'border-amber',
  problem: 'border-coral-ink',
};

type NoticeProps = {
  kind: MarkKind;
  /** First words; the kind's own word when left out. */
  title?: ReactNode;
  /** Announced at once by a screen reader, and able to take the focus. */
  alert?: boolean;
  /** Something to do about it. */
  action?: ReactNode;
  className?: string;
  children?: ReactNode;
};

export function Notice({ kind, title, alert = false, action, className, children }: NoticeProps) {
  return (
    <div
      role={alert ? 'alert' : undefined}
      tabIndex={alert ? -1 : undefined}
      className={cn('flex gap-2.5 border-l-2 py-1 pl-3 text-sm', EDGES[kind], className)}
    >
      <Mark kind={kind} className="mt-0.5" />
      <div className="grid min-w-0 flex-1 gap-1">
        <div>
          <strong className="font-semibold">{title ?? WORDS[kind]}.</strong> {children}
        </div>
        {action && <div className="mt-1 flex flex-wrap gap-2">{action}</div>}
      </div>
    </div>
  );
}
