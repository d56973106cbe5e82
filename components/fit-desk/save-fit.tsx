'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import useSWRMutation from 'swr/mutation';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextArea } from '@/components/ui/text-area';
import { TextInput } from '@/components/ui/text-input';
import type { CarrierProfile, FitAnswer } from '@/lib/inversion/index';
import type { SaveFitInput } from '@/lib/schemas/fit';

import { fetchJson, ServerRefusal } from './fetch-json';

/** Everything to save but its name. */
export type FitToSave = Pick<SaveFitInput, 'scanId' | 'stoppingSetId' | 'parentFitId' | 'spec'> & {
  claimed: { answer: FitAnswer; profile: CarrierProfile };
};

interface SaveFitProps {
  /** null while there is nothing whole to save. */
  fit: FitToSave | null;
  /** Why it cannot be saved now, in a sentence. */
  waitsFor: string | null;
  suggestedName: string;
}

/** Freezes the fit on the server, which works it out again and refuses what does not agree. */
export function SaveFit({ fit, waitsFor, suggestedName }: SaveFitProps) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [name, setName] = useState(suggestedName);
  const [notes, setNotes] = useState('');
  const save = useSWRMutation('/api/fits', postFit);
  const refusal = save.error instanceof ServerRefusal ? save.error : null;

  const submit = async () => {
    if (!fit || save.isMutating) return;
    try {
      const { id } = await save.trigger({ ...fit, name, notes });
      router.push(`/fits/${id}`);
    } catch (error) {
      // The refusal is shown from save.error; anything else is not ours to hide.
      if (!(error instanceof ServerRefusal)) throw error;
    }
  };

  return (
    <>
      <Button
        variant="primary"
        disabled={fit === null}
        title={waitsFor ?? undefined}
        onClick={() => {
          save.reset();
          setOpen(true);
        }}
      >
        Save fit
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Save this fit"
        description="The fit is frozen with its points, stopping set and settings. The server works it out again and keeps it only when it agrees."
        closeLabel="Cancel"
        actions={
          <Button type="submit" form="save-fit" variant="primary" pending={save.isMutating}>
            {save.isMutating ? 'Checking and saving' : 'Save'}
          </Button>
        }
      >
        <form
          id="save-fit"
          noValidate
          className="grid gap-3"
          onSubmit={(event) => {
            event.preventDefault();
            event.stopPropagation();
            void submit();
          }}
        >
          {refusal && (
            <Notice kind="problem" title="Not saved" alert>
              {refusal.message}
            </Notice>
          )}
          <Field label="Name" error={refusal?.fields.name} required>
            <TextInput
              value={name}
              maxLength={80}
              onChange={(event) => setName(event.target.value)}
            />
          </Field>
          <Field label="Notes" error={refusal?.fields.notes} optional>
            <TextArea
              value={notes}
              maxLength={4000}
              rows={3}
              onChange={(event) => setNotes(event.target.value)}
            />
          </Field>
        </form>
      </Dialog>
    </>
  );
}

function postFit(
  path: string,
  { arg }: { arg: FitToSave & { name: string; notes: string } },
): Promise<{ id: string }> {
  return fetchJson(path, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(arg),
  });
}
