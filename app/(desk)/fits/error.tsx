'use client';

import { PageError } from '@/components/shell/page-error';

export default function Failure({ error, retry }: { error: unknown; retry: () => void }) {
  return <PageError error={error} retry={retry} />;
}
