import type { Polarity } from '@/lib/inversion/index';

import { SettingGroup } from './setting-group';

const POLARITIES: readonly { value: Polarity; label: string }[] = [
  { value: 'depletion', label: 'Depletion: few carriers near the surface' },
  { value: 'accumulation', label: 'Accumulation: many carriers near the surface' },
];

export function PolarityChoice({
  value,
  onChange,
}: {
  value: Polarity;
  onChange: (polarity: Polarity) => void;
}) {
  return (
    <SettingGroup title="Polarity" says={value}>
      <fieldset className="grid gap-1 text-sm">
        <legend className="sr-only">Polarity</legend>
        {POLARITIES.map((entry) => (
          <label key={entry.value} className="flex min-h-7 items-center gap-2">
            <input
              type="radio"
              name="polarity"
              value={entry.value}
              checked={value === entry.value}
              onChange={() => onChange(entry.value)}
              className="size-4 accent-kelp"
            />
            {entry.label}
          </label>
        ))}
      </fieldset>
    </SettingGroup>
  );
}
