'use client';

import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/text-area';
import { TextInput } from '@/components/ui/text-input';

import type { StoppingDraft } from './stopping-draft';

interface StoppingMetaFieldsProps {
  draft: StoppingDraft;
  faults: Record<string, string>;
  onChange: (draft: StoppingDraft) => void;
}

/** Name, layer stack and origin of a stopping set. */
export function StoppingMetaFields({ draft, faults, onChange }: StoppingMetaFieldsProps) {
  const change = (part: Partial<StoppingDraft>) => onChange({ ...draft, ...part });
  return (
    <div className="grid gap-4">
      <Field label="Name" name="meta.name" error={faults.name} required>
        <TextInput
          value={draft.name}
          maxLength={80}
          onChange={(event) => change({ name: event.target.value })}
        />
      </Field>
      <Field
        label="Layer stack"
        name="meta.layerStack"
        hint="From the surface down, such as “25 nm SiO₂ on 4H-SiC”."
        error={faults.layerStack}
        required
      >
        <TextInput
          value={draft.layerStack}
          maxLength={200}
          onChange={(event) => change({ layerStack: event.target.value })}
        />
      </Field>
      <Field
        label="Origin"
        name="meta.origin"
        hint="How the profiles were calculated: method, version, density, by whom."
        error={faults.origin}
        optional
      >
        <TextInput
          value={draft.origin}
          maxLength={400}
          onChange={(event) => change({ origin: event.target.value })}
        />
      </Field>
      <Field label="Notes" name="meta.notes" error={faults.notes} optional>
        <TextArea
          value={draft.notes}
          maxLength={4000}
          onChange={(event) => change({ notes: event.target.value })}
        />
      </Field>
    </div>
  );
}
