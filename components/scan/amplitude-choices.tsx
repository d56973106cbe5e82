'use client';

import { Checkbox } from '@/components/ui/checkbox';
import { Field } from '@/components/ui/field';
import { TextInput } from '@/components/ui/text-input';

import type { ScanChoices } from './scan-choices';

interface AmplitudeChoicesProps {
  amplitudes: ScanChoices['amplitudes'];
  onChange: (amplitudes: ScanChoices['amplitudes']) => void;
}

/** Asymmetry amplitudes become fractions by the maximum asymmetry. */
export function AmplitudeChoices({ amplitudes, onChange }: AmplitudeChoicesProps) {
  return (
    <div className="grid gap-3">
      <Checkbox
        label="The values are asymmetry amplitudes"
        hint="Divided by the maximum asymmetry they become fractions."
        checked={amplitudes.on}
        onChange={(event) => onChange({ ...amplitudes, on: event.target.checked })}
      />
      {amplitudes.on && (
        <div className="grid grid-cols-2 gap-3">
          <Field label="Maximum asymmetry" required>
            <TextInput
              numeric
              value={amplitudes.maximum}
              onChange={(event) => onChange({ ...amplitudes, maximum: event.target.value })}
            />
          </Field>
          <Field label="its σ" required>
            <TextInput
              numeric
              value={amplitudes.sigma}
              onChange={(event) => onChange({ ...amplitudes, sigma: event.target.value })}
            />
          </Field>
          <p className="col-span-2 text-[0.8125rem] text-ink-2">
            σ of the maximum asymmetry scales all points together; it is kept apart from the σ of
            each point.
          </p>
        </div>
      )}
    </div>
  );
}
