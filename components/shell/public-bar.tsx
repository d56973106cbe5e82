import Link from 'next/link';

import { Wordmark } from './wordmark';

/** The bar for people who are not signed in. */
export function PublicBar() {
  return (
    <header className="no-print border-b border-rule">
      <div className="page flex min-h-13 items-center gap-5">
        <Wordmark />
        <nav aria-label="Sections" className="ml-auto flex gap-5 text-sm text-ink-2">
          <Link href="/help" className="hover:text-ink hover:underline">
            Help
          </Link>
          <Link href="/sign-in" className="hover:text-ink hover:underline">
            Sign in
          </Link>
        </nav>
      </div>
    </header>
  );
}
