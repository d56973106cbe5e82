import { MAX_RESAMPLES } from '@/lib/inversion/index';

import { NumberField } from './number-field';
import { SettingGroup } from './setting-group';

/** Fewer rows than this give no usable 95 % band. */
const FEWEST = 100;

interface ResamplingSettingsProps {
  resamples: number;
  seed: number;
  onChange: (change: { resamples?: number; seed?: number }, kind: string) => void;
}

/** How the bands are made: parametric resampling, repeatable by its seed. */
export function ResamplingSettings({ resamples, seed, onChange }: ResamplingSettingsProps) {
  return (
    <SettingGroup
      title="Bands"
      says={
        resamples === 0
          ? 'no resampling'
          : `${resamples.toLocaleString('en-GB')} resamples, seed ${seed}`
      }
    >
      <div className="grid grid-cols-2 gap-2">
        <NumberField
          label="Resamples"
          value={resamples}
          range={{ min: 0, max: MAX_RESAMPLES, whole: true }}
          onChange={(next) =>
            next !== null &&
            (next === 0 || next >= FEWEST) &&
            onChange({ resamples: next }, 'resamples')
          }
        />
        <NumberField
          label="Seed"
          value={seed}
          range={{ min: 0, max: 4_294_967_295, whole: true }}
          onChange={(next) => next !== null && onChange({ seed: next }, 'seed')}
        />
      </div>
      <p className="text-[0.8125rem] text-ink-3">
        At least {FEWEST}, or 0 for the quick bands of the covariance alone. The same seed gives the
        same bands on every machine.
      </p>
    </SettingGroup>
  );
}
