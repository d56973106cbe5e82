import Form from 'next/form';

import { buttonStyle } from '@/components/ui/button-style';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { TextLink } from '@/components/ui/text-link';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

interface FitThisScanProps {
  scanId: string;
  energiesKeV: readonly number[];
  sets: readonly StoppingSetRow[];
}

/** The way to the fit desk: the scan is known, the stopping set is chosen here. */
export function FitThisScan({ scanId, energiesKeV, sets }: FitThisScanProps) {
  if (sets.length === 0) {
    return (
      <p className="text-sm">
        A fit needs the stopping profiles of this layer stack.{' '}
        <TextLink href="/stopping/new">Add a stopping set</TextLink> first.
      </p>
    );
  }
  return (
    <Form action="/fits/new" className="flex flex-wrap items-end gap-3">
      <input type="hidden" name="scan" value={scanId} />
      <Field label="Stopping set" name="stopping" className="min-w-0 flex-1 basis-56">
        <Select
          options={sets.map((set) => ({
            value: set.id,
            label: `${set.name}${reachWords(set, energiesKeV)}`,
          }))}
        />
      </Field>
      <button type="submit" className={buttonStyle({ variant: 'primary' })}>
        Fit this scan
      </button>
    </Form>
  );
}

/** Energies outside a set cannot be fitted with it; that is said before it is chosen. */
function reachWords(
  { energiesKeV: known }: StoppingSetRow,
  energiesKeV: readonly number[],
): string {
  const [low, high] = [Math.min(...known), Math.max(...known)];
  const outside = energiesKeV.filter(
    (energy) => energy < low * (1 - 1e-9) || energy > high * (1 + 1e-9),
  );
  if (outside.length === 0) return '';
  return outside.length === 1
    ? ` (does not hold ${outside[0]} keV)`
    : ` (does not hold ${outside.length} of the energies)`;
}
