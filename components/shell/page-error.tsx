'use client';

import { Button } from '@/components/ui/button';
import { ButtonLink } from '@/components/ui/button-link';

type PageErrorProps = {
  error: unknown;
  retry: () => void;
};

/** What happened, what was kept, what to do. The words of the error itself stay in the server's log. */
export function PageError({ error, retry }: PageErrorProps) {
  const digest = digestOf(error);
  return (
    <div role="alert" className="grid prose-measure justify-items-start gap-3 py-12">
      <h1>This page could not be shown</h1>
      <p className="text-ink-2">
        Something failed on the way. Nothing that was saved is lost. Try again; if it happens twice,
        tell whoever runs this server
        {digest ? (
          <>
            {' '}
            and give them the number <span className="figures text-ink">{digest}</span>
          </>
        ) : null}
        .
      </p>
      <div className="flex flex-wrap gap-2">
        <Button variant="primary" onClick={retry}>
          Try again
        </Button>
        <ButtonLink href="/">Go to the home page</ButtonLink>
      </div>
    </div>
  );
}

/** The number under which the server logged it; only errors of the server have one. */
function digestOf(error: unknown): string | null {
  const digest = error instanceof Error && 'digest' in error ? error.digest : null;
  return typeof digest === 'string' ? digest : null;
}
