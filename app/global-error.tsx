'use client';

import { PageError } from '@/components/shell/page-error';

import { fontVariables } from './fonts';
import './globals.css';

type GlobalErrorProps = { error: unknown; retry: () => void };

/** Stands in for the root layout when that itself fails. */
export default function GlobalError({ error, retry }: GlobalErrorProps) {
  return (
    <html lang="en" className={fontVariables}>
      <body>
        <title>Problem · Strandline</title>
        <main id="content" className="page">
          <PageError error={error} retry={retry} />
        </main>
      </body>
    </html>
  );
}
