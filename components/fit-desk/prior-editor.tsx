import { Field } from '@/components/ui/field';
import { TextInput } from '@/components/ui/text-input';
import { Checkbox } from '@/components/ui/checkbox';

import type { Setting } from './assumptions';
import { NumberField } from './number-field';

interface PriorEditorProps {
  label: string;
  unit: string;
  setting: Setting;
  onChange: (change: Partial<Setting>, field: string) => void;
}

/** Value of a held parameter, or the prior of a free one, with the origin of the number. */
export function PriorEditor({ label, unit, setting, onChange }: PriorEditorProps) {
  const { held, value, prior, origin } = setting;
  return (
    <div className="mt-2 mb-1 grid grid-cols-2 gap-2 border-l-2 border-rule pl-3">
      {held && (
        <NumberField
          label="Held at"
          unit={unit || undefined}
          value={value}
          range={{}}
          onChange={(next) => onChange({ value: next }, 'value')}
          className="col-span-2"
        />
      )}
      {!held && (
        <Checkbox
          label="A prior is known"
          checked={prior !== null}
          onChange={(event) =>
            onChange({ prior: event.target.checked ? priorFrom(value) : null }, 'prior')
          }
          className="col-span-2"
        />
      )}
      {!held && prior && (
        <>
          <NumberField
            label="Prior"
            unit={unit || undefined}
            value={prior.mean}
            range={{}}
            onChange={(mean) => mean !== null && onChange({ prior: { ...prior, mean } }, 'mean')}
          />
          <NumberField
            label="±"
            unit={unit || undefined}
            value={prior.sigma}
            range={{ above: 0 }}
            onChange={(sigma) =>
              sigma !== null && onChange({ prior: { ...prior, sigma } }, 'sigma')
            }
          />
        </>
      )}
      {(held || prior) && (
        <Field label="Where it comes from" optional className="col-span-2">
          <TextInput
            aria-label={`${label}: where it comes from`}
            value={origin}
            maxLength={200}
            placeholder="bulk run, resistivity …"
            onChange={(event) => onChange({ origin: event.target.value }, 'origin')}
          />
        </Field>
      )}
    </div>
  );
}

/** A prior to start writing with: the value at hand, known to a tenth. */
function priorFrom(value: number | null): { mean: number; sigma: number } {
  const mean = value ?? 0;
  return { mean, sigma: mean === 0 ? 0.1 : Math.abs(Number((mean / 10).toPrecision(2))) };
}
