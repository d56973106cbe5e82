'use client';

import { Button } from '@/components/ui/button';
import { ButtonLink } from '@/components/ui/button-link';
import { Notice } from '@/components/ui/notice';

/** A page that could not be made. Reading changes nothing, so nothing is lost. */
export function PageFailure({ what, retry }: { what: string; retry: () => void }) {
  return (
    <div className="grid gap-4 pt-8">
      <h1>{what} could not be shown</h1>
      <Notice
        kind="problem"
        alert
        action={
          <>
            <Button onClick={retry}>Try again</Button>
            <ButtonLink href="/">Go to the start page</ButtonLink>
          </>
        }
      >
        Something failed while it was read. Nothing was changed and nothing is lost. If it happens
        again, tell the owner of your team.
      </Notice>
    </div>
  );
}
