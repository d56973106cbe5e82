'use client';

import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import type { FormActionFunction } from '@/components/ui/form-state';
import { TextArea } from '@/components/ui/text-area';

import { FormDialog } from './form-dialog';

interface DecisionProps {
  fitId: string;
  fitName: string;
  may: { accept: boolean; return: boolean };
  acceptAction: FormActionFunction<unknown>;
  returnAction: FormActionFunction<unknown>;
}

/** Accept or return. Neither shows to who may not; the server decides again. */
export function Decision({ fitId, fitName, may, acceptAction, returnAction }: DecisionProps) {
  return (
    <>
      {may.return && (
        <FormDialog
          trigger={<Button>Return…</Button>}
          title="Return this fit?"
          description={
            <p>
              “{fitName}” goes back to its analyst with your reason. It stays as it is; a revision
              will be a new fit that names this one.
            </p>
          }
          confirmLabel="Return the fit"
          pendingLabel="Returning…"
          action={returnAction}
        >
          <input type="hidden" name="id" value={fitId} />
          <Field
            name="reason"
            label="Reason"
            required
            hint="What is wrong or missing, so that the next fit can answer it."
          >
            <TextArea rows={5} />
          </Field>
        </FormDialog>
      )}
      {may.accept && (
        <FormDialog
          trigger={<Button variant="primary">Accept…</Button>}
          title="Accept and issue this profile?"
          description={
            <>
              <p>
                “{fitName}” becomes a numbered issued profile that everyone in the team can cite and
                export.
              </p>
              <p>
                An issued profile cannot be changed, and accepting <strong>cannot be undone</strong>
                .
              </p>
            </>
          }
          confirmLabel="Accept and issue"
          pendingLabel="Issuing…"
          action={acceptAction}
        >
          <input type="hidden" name="id" value={fitId} />
          <Field name="note" label="Note" optional hint="Stays in the history of the profile.">
            <TextArea rows={3} />
          </Field>
        </FormDialog>
      )}
    </>
  );
}
