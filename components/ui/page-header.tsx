import Link from 'next/link';
import { Fragment, type ReactNode } from 'react';

type PageHeaderProps = {
  /** From the section down to the parent; the page itself is the title. */
  breadcrumb?: readonly { label: ReactNode; href?: string }[];
  title: ReactNode;
  /** StateBadge, InventedMark. */
  badge?: ReactNode;
  /** Facts in one line, set apart by points. */
  meta?: readonly ReactNode[];
  actions?: ReactNode;
};

export function PageHeader({ breadcrumb = [], title, badge, meta = [], actions }: PageHeaderProps) {
  const facts = meta.filter(
    (fact) => fact !== null && fact !== undefined && fact !== false && fact !== '',
  );
  return (
    <header className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3 border-b border-ink pt-5 pb-4">
      <div className="grid min-w-0 gap-1">
        {breadcrumb.length > 0 && (
          <nav aria-label="Where this page is">
            <ol className="flex flex-wrap gap-x-2 text-[0.8125rem] text-ink-3">
              {breadcrumb.map((step, index) => (
                <li key={index} className="flex gap-2">
                  {index > 0 && <span aria-hidden="true">/</span>}
                  {step.href ? (
                    <Link href={step.href} className="hover:text-ink hover:underline">
                      {step.label}
                    </Link>
                  ) : (
                    step.label
                  )}
                </li>
              ))}
            </ol>
          </nav>
        )}
        <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
          <h1>{title}</h1>
          {badge}
        </div>
        {facts.length > 0 && (
          <p className="text-sm text-ink-2">
            {facts.map((fact, index) => (
              <Fragment key={index}>
                {index > 0 && <span aria-hidden="true"> · </span>}
                {fact}
              </Fragment>
            ))}
          </p>
        )}
      </div>
      {actions && <div className="no-print flex flex-wrap gap-2">{actions}</div>}
    </header>
  );
}
