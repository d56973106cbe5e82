'use client';

import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { TextArea } from '@/components/ui/text-area';
import { TextInput } from '@/components/ui/text-input';

import {
  ILLUMINATION_OPTIONS,
  illuminationOf,
  OBSERVABLE_OPTIONS,
  observableOf,
  type ScanDraft,
} from './scan-draft';

interface ScanMetaFieldsProps {
  draft: ScanDraft;
  faults: Record<string, string>;
  onChange: (draft: ScanDraft) => void;
}

/** Name and conditions of a scan. */
export function ScanMetaFields({ draft, faults, onChange }: ScanMetaFieldsProps) {
  const change = (part: Partial<ScanDraft>) => onChange({ ...draft, ...part });
  return (
    <div className="grid gap-4">
      <Field label="Name" hint="Such as “205 K, dark”." error={faults.name} required>
        <TextInput
          value={draft.name}
          maxLength={80}
          onChange={(event) => change({ name: event.target.value })}
        />
      </Field>
      <Field label="What was measured" error={faults.observable}>
        <Select
          options={OBSERVABLE_OPTIONS}
          value={draft.observable}
          onChange={(event) => change({ observable: observableOf(event.target.value) })}
        />
      </Field>
      <div className="grid grid-cols-2 items-end gap-3">
        <Field label="Temperature" unit="K" error={faults.temperatureK} optional>
          <TextInput
            numeric
            value={draft.temperatureK}
            onChange={(event) => change({ temperatureK: event.target.value })}
          />
        </Field>
        <Field label="Field" unit="mT" error={faults.fieldMT} optional>
          <TextInput
            numeric
            value={draft.fieldMT}
            onChange={(event) => change({ fieldMT: event.target.value })}
          />
        </Field>
      </div>
      <Field label="Illumination" error={faults.illumination}>
        <Select
          options={ILLUMINATION_OPTIONS}
          value={draft.illumination}
          onChange={(event) => change({ illumination: illuminationOf(event.target.value) })}
        />
      </Field>
      {draft.illumination !== 'dark' && <LightCaution />}
      <Field label="Measured on" error={faults.measuredOn} optional>
        <TextInput
          type="date"
          value={draft.measuredOn}
          onChange={(event) => change({ measuredOn: event.target.value })}
        />
      </Field>
      <Field label="Notes" error={faults.notes} optional>
        <TextArea
          value={draft.notes}
          maxLength={4000}
          onChange={(event) => change({ notes: event.target.value })}
        />
      </Field>
    </div>
  );
}

function LightCaution() {
  return (
    <Notice kind="caution" title="Lamps and lasers can hurt eyes and skin">
      Sources follow the facility’s laser-safety rules; ultraviolet lamps too. Ask its laser-safety
      officer, and leave setting up to trained and licensed staff.
    </Notice>
  );
}
