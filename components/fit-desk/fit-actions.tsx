import { ButtonLink } from '@/components/ui/button-link';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import type { FormActionFunction } from '@/components/ui/form-state';
import type { Fit } from '@/lib/schemas/fit';

import { SubmitFit } from './submit-fit';

interface FitActionsProps {
  fit: Pick<Fit, 'id' | 'name' | 'state' | 'may' | 'issuedProfileId' | 'issuedNumber'>;
  submit: FormActionFunction<unknown>;
  discard: FormActionFunction<unknown>;
}

/** What the viewer may do with a saved fit. */
export function FitActions({ fit, submit, discard }: FitActionsProps) {
  const { id, may, issuedProfileId, issuedNumber } = fit;
  return (
    <>
      {may.discard && (
        <ConfirmDialog
          trigger={<Button variant="danger">Discard</Button>}
          title={`Discard “${fit.name}”?`}
          confirmLabel="Discard the fit"
          cancelLabel="Keep it"
          action={discard}
          input={{ id }}
        >
          The frozen fit is removed and cannot be brought back. Scan and stopping set stay.
        </ConfirmDialog>
      )}
      <ButtonLink href={`/compare?fits=${id}`}>Compare</ButtonLink>
      {may.revise && <ButtonLink href={`/fits/new?from=${id}`}>Revise</ButtonLink>}
      {fit.state !== 'draft' && <ButtonLink href={`/reviews/${id}`}>See the review</ButtonLink>}
      {issuedProfileId && (
        <ButtonLink href={`/profiles/${issuedProfileId}`} variant="primary">
          {issuedNumber ?? 'Issued profile'}
        </ButtonLink>
      )}
      {may.submit && <SubmitFit fitId={id} action={submit} />}
    </>
  );
}
