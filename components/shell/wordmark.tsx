import Link from 'next/link';

import { StrandlineMark } from './strandline-mark';

export function Wordmark() {
  return (
    <Link href="/" className="flex items-center gap-2.5" aria-label="Strandline, home">
      <StrandlineMark className="h-5 w-6" />
      <span className="font-serif text-xl font-semibold tracking-[-0.01em]">Strandline</span>
    </Link>
  );
}
