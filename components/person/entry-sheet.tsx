import type { ReactNode } from 'react';

type EntrySheetProps = {
  title: ReactNode;
  lead?: ReactNode;
  after?: ReactNode;
  children: ReactNode;
};

/** The one form of a page where somebody comes in: sign in, sign up, invitation. */
export function EntrySheet({ title, lead, after, children }: EntrySheetProps) {
  return (
    <div className="mx-auto grid w-full max-w-sm gap-5 py-10 sm:py-16">
      <header className="grid gap-2 border-b border-ink pb-4">
        <h1>{title}</h1>
        {lead && <p className="text-sm text-ink-2">{lead}</p>}
      </header>
      {children}
      {after && <p className="border-t border-rule pt-4 text-sm text-ink-2">{after}</p>}
    </div>
  );
}
