'use client';

import { useState } from 'react';

import { Field } from '@/components/ui/field';
import { TextInput } from '@/components/ui/text-input';

import { numberText, readNumber, type NumberRange } from './read-number';

interface NumberFieldProps {
  label: string;
  unit?: string;
  hint?: string;
  value: number | null;
  range: NumberRange;
  /** Blank is allowed and means "not known". */
  optional?: boolean;
  onChange: (value: number | null) => void;
  className?: string;
}

/** A number that is taken as soon as it reads as one; what does not is kept as typed, with its reason. */
export function NumberField({
  label,
  unit,
  hint,
  value,
  range,
  optional = false,
  onChange,
  className,
}: NumberFieldProps) {
  const [draft, setDraft] = useState<{ text: string; for: number | null } | null>(null);
  // A draft holds only as long as the value stays what the draft made of it: an undo shows the old number.
  const text = draft && draft.for === value ? draft.text : numberText(value);
  const read = readNumber(text, label, range, optional);
  return (
    <Field
      label={label}
      unit={unit}
      hint={hint}
      error={read.ok ? undefined : read.message}
      className={className}
    >
      <TextInput
        numeric
        value={text}
        onChange={(event) => {
          const next = readNumber(event.target.value, label, range, optional);
          setDraft({ text: event.target.value, for: next.ok ? next.value : value });
          if (next.ok) onChange(next.value);
        }}
      />
    </Field>
  );
}
