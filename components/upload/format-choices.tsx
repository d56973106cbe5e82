'use client';

import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import type { Decimal, Delimiter } from '@/lib/files/table';

const DELIMITERS: Record<Delimiter, string> = {
  comma: 'comma ,',
  semicolon: 'semicolon ;',
  tab: 'tab',
  blanks: 'blanks',
};
const DECIMALS: Record<Decimal, string> = { point: 'point 0.5', comma: 'comma 0,5' };

interface FormatChoicesProps {
  delimiter: Delimiter;
  decimal: Decimal;
  onDelimiter: (delimiter: Delimiter) => void;
  onDecimal: (decimal: Decimal) => void;
}

/** How the text was taken apart, open to correction. */
export function FormatChoices({ delimiter, decimal, onDelimiter, onDecimal }: FormatChoicesProps) {
  return (
    <div className="grid grid-cols-2 gap-3">
      <Field label="Between cells">
        <Select
          value={delimiter}
          onChange={(event) => onDelimiter(event.target.value as Delimiter)}
        >
          {Object.entries(DELIMITERS).map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Decimal mark">
        <Select value={decimal} onChange={(event) => onDecimal(event.target.value as Decimal)}>
          {Object.entries(DECIMALS).map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
    </div>
  );
}
