import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { significant } from '@/lib/format';
import type { Observable } from '@/lib/inversion/index';
import type { FitSpec } from '@/lib/schemas/fit';

import { DEFAULT_GAMMA } from './assumptions';
import { NumberField } from './number-field';
import { SettingGroup } from './setting-group';

type Response = FitSpec['response'];

/** What the desk offers for each observable; a new response is one entry here. */
export const RESPONSE_KINDS: readonly {
  kind: Response['kind'];
  observable: Observable;
  label: string;
  says: string;
  start: Response;
}[] = [
  {
    kind: 'two-level',
    observable: 'fraction',
    label: 'Two-level fraction',
    says: 'The fraction switches between its carrier-free and its populated level.',
    start: { kind: 'two-level' },
  },
  {
    kind: 'capture-rate',
    observable: 'rate',
    label: 'Capture rate',
    says: 'The rate is γ times the concentration, over a rate Λ₀ without carriers.',
    start: {
      kind: 'capture-rate',
      gammaCm3PerS: DEFAULT_GAMMA,
      gammaSigmaCm3PerS: null,
      baselinePerUs: 0,
    },
  },
];

/** What the probe sees of a concentration. */
export function ResponseSettings({
  response,
  observable,
  onChange,
}: {
  response: Response;
  observable: Observable;
  onChange: (response: Response, kind: string) => void;
}) {
  const offered = RESPONSE_KINDS.filter((entry) => entry.observable === observable);
  const entry = offered.find(({ kind }) => kind === response.kind);
  return (
    <SettingGroup title="Response" says={responseText(response)}>
      <Field label="What the probe sees" hint={entry?.says}>
        <Select
          value={response.kind}
          onChange={(event) => {
            const next = offered.find(({ kind }) => kind === event.target.value);
            if (next) onChange(next.start, 'response');
          }}
          options={offered.map(({ kind, label }) => ({ value: kind, label }))}
        />
      </Field>
      {response.kind === 'capture-rate' && (
        <>
          <div className="grid grid-cols-2 gap-2">
            <NumberField
              label="γ"
              unit="cm³ s⁻¹"
              value={response.gammaCm3PerS}
              range={{ above: 0 }}
              onChange={(gamma) =>
                gamma !== null && onChange({ ...response, gammaCm3PerS: gamma }, 'gamma')
              }
            />
            <NumberField
              label="γ ±"
              unit="cm³ s⁻¹"
              value={response.gammaSigmaCm3PerS}
              range={{ min: 0 }}
              optional
              onChange={(gammaSigmaCm3PerS) =>
                onChange({ ...response, gammaSigmaCm3PerS }, 'gamma sigma')
              }
            />
          </div>
          <p className="text-[0.8125rem] text-ink-3">
            About 10⁻⁶ cm³ s⁻¹ for holes in germanium near 200 K (common practice, no source). Its
            uncertainty moves the whole profile and is shown apart from the bands.
          </p>
          <NumberField
            label="Rate without carriers, Λ₀"
            unit="µs⁻¹"
            value={response.baselinePerUs}
            range={{ min: 0 }}
            onChange={(baseline) =>
              baseline !== null && onChange({ ...response, baselinePerUs: baseline }, 'baseline')
            }
          />
        </>
      )}
    </SettingGroup>
  );
}

export function responseText(response: Response): string {
  if (response.kind === 'two-level') return 'two-level';
  return `capture rate, γ ${significant(response.gammaCm3PerS, 2)} cm³ s⁻¹`;
}
