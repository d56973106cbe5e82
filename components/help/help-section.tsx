import type { ReactNode } from 'react';

type HelpSectionProps = { id: string; title: string; children: ReactNode };

export function HelpSection({ id, title, children }: HelpSectionProps) {
  return (
    <section
      id={id}
      aria-labelledby={`${id}-title`}
      className="grid gap-3 border-t border-rule py-7 first:border-0"
    >
      <h2 id={`${id}-title`} className="font-serif text-xl font-semibold">
        {title}
      </h2>
      {children}
    </section>
  );
}
