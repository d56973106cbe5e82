import { ButtonLink } from '@/components/ui/button-link';
import { Notice } from '@/components/ui/notice';
import { TextLink } from '@/components/ui/text-link';
import type { Fit } from '@/lib/schemas/fit';

/** Where the fit stands, and what follows from it for the person who looks. */
export function ReviewStanding({ fit, own }: { fit: Fit; own: boolean }) {
  const returned = fit.events.findLast((event) => event.kind === 'returned');
  return (
    <div className="grid gap-3 pt-4 empty:hidden">
      {own && fit.state === 'submitted' && (
        <Notice kind="information" title="Yours">
          You made this fit: someone else must review it.
        </Notice>
      )}
      {!own && fit.state === 'submitted' && !fit.may.accept && (
        <Notice kind="information" title="In review">
          A reviewer decides on it. You may comment.
        </Notice>
      )}
      {fit.state === 'draft' && (
        <Notice kind="information" title="Not in review">
          This fit is a draft. Its analyst sends it to review from the fit desk.
        </Notice>
      )}
      {fit.state === 'accepted' && fit.issuedProfileId && (
        <Notice kind="fine" title="Accepted">
          It is issued as{' '}
          <TextLink href={`/profiles/${fit.issuedProfileId}`}>{fit.issuedNumber}</TextLink>.
        </Notice>
      )}
      {fit.state === 'returned' && (
        <Notice
          kind="caution"
          title="Returned"
          action={
            fit.may.revise && (
              <ButtonLink size="small" href={`/fits/new?from=${fit.id}`}>
                Revise as a new fit
              </ButtonLink>
            )
          }
        >
          {returned ? `${returned.person}: ${returned.body}` : 'No reason was kept.'}
        </Notice>
      )}
      {fit.parent && (
        <p className="text-sm text-ink-2">
          It comes from <TextLink href={`/fits/${fit.parent.id}`}>{fit.parent.name}</TextLink>.
        </p>
      )}
      {fit.scanChangedSince && (
        <Notice kind="caution" title="The scan changed since">
          The scan was edited after this fit was frozen. The fit still rests on the points as they
          were then, shown here.
        </Notice>
      )}
    </div>
  );
}
