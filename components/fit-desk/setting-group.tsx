import type { ReactNode } from 'react';

/** A folded group of settings whose title bar says what they stand at. */
export function SettingGroup({
  title,
  says,
  open = false,
  children,
}: {
  title: string;
  says: ReactNode;
  open?: boolean;
  children: ReactNode;
}) {
  return (
    <details open={open} className="group border-t border-rule first:border-t-0">
      <summary className="flex list-none items-baseline justify-between gap-3 py-1.5 text-sm [&::-webkit-details-marker]:hidden">
        <span className="shrink-0 underline decoration-edge decoration-dotted underline-offset-4 group-open:font-semibold">
          {title}
        </span>
        <span className="min-w-0 text-right text-[0.8125rem] text-ink-2 group-open:hidden">
          {says}
        </span>
      </summary>
      <div className="grid gap-2.5 pb-3">{children}</div>
    </details>
  );
}
