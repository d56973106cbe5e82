'use client';

import { PageError } from '@/components/shell/page-error';

type PublicErrorProps = { error: unknown; retry: () => void };

export default function PublicError({ error, retry }: PublicErrorProps) {
  return <PageError error={error} retry={retry} />;
}
