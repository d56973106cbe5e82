import Link from 'next/link';

import { Notice } from '@/components/ui/notice';
import type { Fit } from '@/lib/schemas/fit';

/** What a reader of a saved fit must know first: why it came back, where it came from, what changed since. */
export function SavedFitNotices({
  fit,
}: {
  fit: Pick<Fit, 'state' | 'events' | 'parent' | 'scanChangedSince' | 'notes' | 'scanId'>;
}) {
  const returned =
    fit.state === 'returned' ? fit.events.findLast(({ kind }) => kind === 'returned') : undefined;
  return (
    <div className="grid gap-2 pt-3 empty:hidden">
      {returned && (
        <Notice kind="caution" title={`Returned by ${returned.person}`}>
          {returned.body}
        </Notice>
      )}
      {fit.scanChangedSince && (
        <Notice kind="information">
          <Link href={`/scans/${fit.scanId}`} className="text-link">
            The scan
          </Link>{' '}
          was edited after this fit was frozen. The fit keeps the points that it was made from.
        </Notice>
      )}
      {(fit.parent || fit.notes) && (
        <p className="prose-measure text-sm text-ink-2">
          {fit.parent && (
            <>
              Comes from{' '}
              <Link href={`/fits/${fit.parent.id}`} className="text-link">
                {fit.parent.name}
              </Link>
              .{' '}
            </>
          )}
          {fit.notes}
        </p>
      )}
    </div>
  );
}
