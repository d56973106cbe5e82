import Link from 'next/link';

import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import type { ScanPoint } from '@/lib/inversion/index';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

import { uncoveredEnergies } from './fit-input';
import { SettingGroup } from './setting-group';

interface StoppingChoiceProps {
  sets: readonly StoppingSetRow[];
  chosenId: string | null;
  points: readonly ScanPoint[];
  capThicknessNm: number;
  /** Interpolated among the energies in use. */
  interpolatedKeV: readonly number[];
  warnings: readonly string[];
  onChange: (id: string) => void;
}

/** Which stopping profiles are folded with; sets that miss energies of the scan say so. */
export function StoppingChoice({
  sets,
  chosenId,
  points,
  interpolatedKeV,
  warnings,
  onChange,
}: StoppingChoiceProps) {
  const chosen = sets.find(({ id }) => id === chosenId) ?? null;
  return (
    <SettingGroup title="Stopping set" says={chosen?.name ?? 'none chosen'} open={chosen === null}>
      <Field
        label="Stopping profiles of the layer stack"
        hint={
          chosen
            ? `${chosen.layerStack}; ${chosen.energiesKeV.length} energies, ${ladderText(chosen)}`
            : undefined
        }
      >
        <Select value={chosenId ?? ''} onChange={(event) => onChange(event.target.value)}>
          {chosen === null && <option value="">Choose a stopping set</option>}
          {sets.map((set) => {
            const missing = uncoveredEnergies(points, set.energiesKeV);
            return (
              <option key={set.id} value={set.id}>
                {set.name}
                {missing.length > 0 ? ` (misses ${missing.join(', ')} keV)` : ''}
              </option>
            );
          })}
        </Select>
      </Field>
      {interpolatedKeV.length > 0 && (
        <p className="text-[0.8125rem] text-ink-2">
          Interpolated between neighbours: {interpolatedKeV.join(', ')} keV. Marked in the figures.
        </p>
      )}
      {warnings.map((warning) => (
        <p key={warning} className="text-[0.8125rem] text-amber">
          Caution: {warning}
        </p>
      ))}
      <p className="text-[0.8125rem]">
        <Link href={chosen ? `/stopping/${chosen.id}` : '/stopping/new'} className="text-link">
          {chosen ? 'See this stopping set' : 'Add a stopping set'}
        </Link>
      </p>
    </SettingGroup>
  );
}

function ladderText({ energiesKeV }: StoppingSetRow): string {
  return energiesKeV.length === 0
    ? 'no energies'
    : `${Math.min(...energiesKeV)} to ${Math.max(...energiesKeV)} keV`;
}
