'use client';

import { PageError } from '@/components/shell/page-error';

type DeskErrorProps = { error: unknown; retry: () => void };

export default function DeskError({ error, retry }: DeskErrorProps) {
  return <PageError error={error} retry={retry} />;
}
