'use client';

import { useState } from 'react';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';

/** Sends a fit to review, with a word to the reviewer. */
export function SubmitFit({
  fitId,
  action,
}: {
  fitId: string;
  action: FormActionFunction<unknown>;
}) {
  const [open, setOpen] = useState(false);
  return (
    <Dialog
      open={open}
      onOpenChange={setOpen}
      trigger={<Button variant="primary">Submit to review</Button>}
      title="Submit this fit to review"
      description="A reviewer accepts it or returns it with reasons. It cannot be discarded any more."
      closeLabel="Cancel"
    >
      <Form action={action} onDone={() => setOpen(false)}>
        <input type="hidden" name="id" value={fitId} />
        <Field label="Note to the reviewer" name="note" optional>
          <TextArea rows={3} maxLength={2000} />
        </Field>
        <div>
          <SubmitButton pendingLabel="Submitting">Submit</SubmitButton>
        </div>
      </Form>
    </Dialog>
  );
}
