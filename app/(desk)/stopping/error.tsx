'use client';

import { PageFailure } from '@/components/review/page-failure';

export default function Failure({ reset }: { reset: () => void }) {
  return <PageFailure what="The stopping set" retry={reset} />;
}
