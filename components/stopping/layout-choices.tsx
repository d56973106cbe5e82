'use client';

import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';

import type { Layout } from './preview-stopping';
import type { StoppingChoices } from './stopping-choices';

interface LayoutChoicesProps {
  /** As recognised; what was chosen goes before it. */
  layout: Layout;
  choices: StoppingChoices;
  onChoose: (change: Partial<Omit<StoppingChoices, 'entries'>>) => void;
}

const DEPTH_UNITS = [
  { value: 'nm', label: 'nm' },
  { value: 'A', label: 'Å' },
  { value: 'um', label: 'µm' },
] as const;
const POSITIONS = [
  { value: 'centres', label: 'centres of bins' },
  { value: 'edges', label: 'lower edges of bins' },
] as const;
const WEIGHTS = [
  { value: 'counts', label: 'counts in a bin' },
  { value: 'density', label: 'density (per depth)' },
] as const;

/** What the numbers in the files mean; the same for all files of a set. */
export function LayoutChoices({ layout, choices, onChoose }: LayoutChoicesProps) {
  const { implanted, depthUnit, positionsAre, weightsAre } = choices;
  return (
    <div className="grid gap-3 sm:grid-cols-2">
      <Field label="Depths are in">
        <Select
          options={DEPTH_UNITS}
          value={depthUnit ?? layout.depthUnit}
          onChange={(event) => onChoose({ depthUnit: known(DEPTH_UNITS, event.target.value) })}
        />
      </Field>
      <Field label="Depths are">
        <Select
          options={POSITIONS}
          value={positionsAre ?? layout.positionsAre}
          onChange={(event) => onChoose({ positionsAre: known(POSITIONS, event.target.value) })}
        />
      </Field>
      <Field label="Numbers are">
        <Select
          options={WEIGHTS}
          value={weightsAre ?? layout.weightsAre}
          onChange={(event) => onChoose({ weightsAre: known(WEIGHTS, event.target.value) })}
        />
      </Field>
      {(weightsAre ?? layout.weightsAre) === 'counts' && (
        <Field
          label="Muons implanted per energy"
          optional
          hint="Gives the share that did not stop within the depths."
        >
          <TextInput
            numeric
            value={
              implanted ??
              (layout.implantedPerEnergy === null ? '' : String(layout.implantedPerEnergy))
            }
            onChange={(event) => onChoose({ implanted: event.target.value })}
          />
        </Field>
      )}
    </div>
  );
}

function known<Value extends string>(
  options: readonly { value: Value }[],
  value: string,
): Value | null {
  return options.find((option) => option.value === value)?.value ?? null;
}
