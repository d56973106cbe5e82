'use client';

import { PageError } from '@/components/shell/page-error';

type ErrorPageProps = { error: unknown; retry: () => void };

export default function ErrorPage({ error, retry }: ErrorPageProps) {
  return (
    <main id="content" tabIndex={-1} className="page outline-none">
      <PageError error={error} retry={retry} />
    </main>
  );
}
