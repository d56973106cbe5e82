'use client';

import { PageError } from '@/components/shell/page-error';

/** The shell's page of an error, for a segment that knows no more than that something failed. */
export function PageFailure({ retry }: { what: string; retry: () => void }) {
  return <PageError error={null} retry={retry} />;
}
