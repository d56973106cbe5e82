import { ButtonLink } from '@/components/ui/button-link';
import { Notice } from '@/components/ui/notice';

interface DeskNoticesProps {
  /** Words of the address that could not be read. */
  unread: readonly string[];
  parent: { name: string; scanChangedSince: boolean } | null;
  stoppingError: string | null;
  noSets: boolean;
  /** Energies in use that no stopping set covers; empty when one does. */
  uncoveredKeV: readonly number[];
}

/** What must be known before the desk is used, above its columns. */
export function DeskNotices({
  unread,
  parent,
  stoppingError,
  noSets,
  uncoveredKeV,
}: DeskNoticesProps) {
  const addSet = (
    <ButtonLink href="/stopping/new" size="small">
      Add a stopping set
    </ButtonLink>
  );
  return (
    <div className="grid gap-2 pt-3 empty:hidden">
      {unread.length > 0 && (
        <Notice kind="caution">
          Parts of this address could not be read and were left as usual: {unread.join(', ')}.
        </Notice>
      )}
      {parent?.scanChangedSince && (
        <Notice kind="information">
          The scan was edited after “{parent.name}” was frozen: this desk shows the points as they
          are now.
        </Notice>
      )}
      {stoppingError !== null && (
        <Notice kind="problem">The stopping set could not be read: {stoppingError}</Notice>
      )}
      {noSets && (
        <Notice kind="information" title="No stopping set yet" action={addSet}>
          A fit folds the trial profile through the stopping profiles of the layer stack.
        </Notice>
      )}
      {!noSets && uncoveredKeV.length > 0 && (
        <Notice kind="caution" title="No stopping set covers these energies" action={addSet}>
          {uncoveredKeV.join(', ')} keV lie outside even the nearest set, and stopping profiles are
          never extrapolated. Switch these points off, or add a set that reaches them.
        </Notice>
      )}
    </div>
  );
}
