'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';

import { ButtonLink } from '@/components/ui/button-link';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { SubmitButton } from '@/components/ui/submit-button';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

import { draftOfStopping } from './stopping-draft';
import { StoppingMetaFields } from './stopping-meta-fields';

interface EditStoppingFormProps {
  set: StoppingSetRow;
  action: FormActionFunction<{ id: string }>;
}

/** Name and origin of a stored set; its profiles and files never change. */
export function EditStoppingForm({ set, action }: EditStoppingFormProps) {
  const router = useRouter();
  const [draft, setDraft] = useState(() => draftOfStopping(set));
  return (
    <Form
      action={action}
      label={`Edit ${set.name}`}
      className="max-w-xl"
      onDone={() => router.push(`/stopping/${set.id}`)}
    >
      <input type="hidden" name="id" value={set.id} />
      <StoppingMetaFields draft={draft} faults={{}} onChange={setDraft} />
      <div className="flex flex-wrap gap-2">
        <SubmitButton pendingLabel="Saving…">Save changes</SubmitButton>
        <ButtonLink href={`/stopping/${set.id}`}>Cancel</ButtonLink>
      </div>
    </Form>
  );
}
