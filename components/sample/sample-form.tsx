import { ButtonLink } from '@/components/ui/button-link';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { Select } from '@/components/ui/select';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import { TextInput } from '@/components/ui/text-input';
import type { Sample } from '@/lib/schemas/sample';

type SampleFormProps = {
  action: FormActionFunction<{ id: string }>;
  /** The sample to edit; left out for a new one. */
  sample?: Sample;
  cancelHref: string;
};

export function SampleForm({ action, sample, cancelHref }: SampleFormProps) {
  return (
    <Form action={action} label={sample ? `Edit ${sample.name}` : 'New sample'} className="gap-8">
      {sample && <input type="hidden" name="id" value={sample.id} />}
      <WhatItIs sample={sample} />
      <Doping sample={sample} />
      <CapLayer sample={sample} />
      <Words sample={sample} />
      <div className="flex flex-wrap gap-2 border-t border-rule pt-4">
        <SubmitButton pendingLabel="Saving …">
          {sample ? 'Save the changes' : 'Add the sample'}
        </SubmitButton>
        <ButtonLink href={cancelHref}>Cancel</ButtonLink>
      </div>
    </Form>
  );
}

type PartProps = { sample?: Sample };

function WhatItIs({ sample }: PartProps) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field label="Name" name="name" required hint="The name on the wafer or in the logbook.">
        <TextInput defaultValue={sample?.name} maxLength={80} />
      </Field>
      <Field label="Material" name="material" required hint="Such as n-type 4H-SiC.">
        <TextInput defaultValue={sample?.material} maxLength={80} />
      </Field>
      <Field label="Majority carriers" name="carrier" required>
        <Select
          defaultValue={sample?.carrier ?? 'electrons'}
          options={[
            { value: 'electrons', label: 'Electrons (n-type)' },
            { value: 'holes', label: 'Holes (p-type)' },
          ]}
        />
      </Field>
    </div>
  );
}

function Doping({ sample }: PartProps) {
  return (
    <fieldset className="grid gap-4 sm:grid-cols-2">
      <Legend text="Doping">
        Used as the bulk concentration of a fit. Leave it blank when it is not known; blank is never
        taken as zero.
      </Legend>
      <Field label="Doping" name="dopingPerCm3" unit="cm⁻³" optional hint="Such as 1.1e16.">
        <TextInput numeric defaultValue={numberText(sample?.dopingPerCm3)} />
      </Field>
      <Field label="Its uncertainty" name="dopingSigmaPerCm3" unit="cm⁻³, one σ" optional>
        <TextInput numeric defaultValue={numberText(sample?.dopingSigmaPerCm3)} />
      </Field>
    </fieldset>
  );
}

function CapLayer({ sample }: PartProps) {
  return (
    <fieldset className="grid gap-4 sm:grid-cols-2">
      <Legend text="Cap layer">
        What lies on the semiconductor: an oxide, a metal. Depths of a carrier profile count from
        below it.
      </Legend>
      <Field label="Material of the cap" name="capMaterial" optional>
        <TextInput defaultValue={sample?.capMaterial} maxLength={80} />
      </Field>
      <Field label="Thickness" name="capThicknessNm" unit="nm" optional>
        <TextInput numeric defaultValue={numberText(sample?.capThicknessNm)} />
      </Field>
    </fieldset>
  );
}

function Words({ sample }: PartProps) {
  return (
    <div className="grid gap-4">
      <Field label="Treatment" name="treatment" optional hint="Such as oxidised and annealed.">
        <TextInput defaultValue={sample?.treatment} maxLength={200} />
      </Field>
      <Field label="Notes" name="notes" optional>
        <TextArea defaultValue={sample?.notes} maxLength={4000} />
      </Field>
    </div>
  );
}

function Legend({ text, children }: { text: string; children: string }) {
  return (
    <>
      <legend className="mb-1 font-semibold">{text}</legend>
      <p className="-mt-1 text-[0.8125rem] text-ink-3 sm:col-span-2">{children}</p>
    </>
  );
}

function numberText(value: number | null | undefined): string {
  return value === null || value === undefined ? '' : String(value);
}
