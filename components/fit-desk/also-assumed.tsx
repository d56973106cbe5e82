import { memo } from 'react';

import type { ScanPoint } from '@/lib/inversion/index';
import type { Sample } from '@/lib/schemas/sample';
import type { Scan } from '@/lib/schemas/scan';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

import type { Assumptions } from './assumptions';
import { CarrierSettings } from './carrier-settings';
import { NumberField } from './number-field';
import { PolarityChoice } from './polarity-choice';
import { ResamplingSettings } from './resampling-settings';
import { ResponseSettings } from './response-settings';
import { SettingGroup } from './setting-group';
import { StoppingChoice } from './stopping-choice';

interface AlsoAssumedProps {
  assumptions: Assumptions;
  scan: Pick<Scan, 'observable'>;
  sample: Sample;
  points: readonly ScanPoint[];
  sets: readonly StoppingSetRow[];
  interpolatedKeV: readonly number[];
  warnings: readonly string[];
  change: (change: (present: Assumptions) => Assumptions, kind?: string) => void;
}

/**
 * Everything assumed besides the trial profile and its parameters, folded to one line each. Not drawn
 * anew while a handle moves.
 */
export const AlsoAssumed = memo(function AlsoAssumed({
  assumptions,
  scan,
  sample,
  points,
  sets,
  interpolatedKeV,
  warnings,
  change,
}: AlsoAssumedProps) {
  const put = (part: Partial<Assumptions>, kind?: string) =>
    change((present) => ({ ...present, ...part }), kind);
  const { capThicknessNm, response } = assumptions;
  return (
    <section aria-labelledby="also-heading">
      <h2 id="also-heading" className="mb-1 text-sm text-ink-2">
        Also assumed
      </h2>
      <StoppingChoice
        sets={sets}
        chosenId={assumptions.stoppingSetId}
        points={points}
        capThicknessNm={capThicknessNm}
        interpolatedKeV={interpolatedKeV}
        warnings={warnings}
        onChange={(stoppingSetId) => put({ stoppingSetId })}
      />
      <ResponseSettings
        response={response}
        observable={scan.observable}
        onChange={(next, kind) => put({ response: next }, kind)}
      />
      <PolarityChoice value={assumptions.polarity} onChange={(polarity) => put({ polarity })} />
      {response.kind !== 'capture-rate' && (
        <CarrierSettings
          carriers={assumptions.carriers}
          polarity={assumptions.polarity}
          sample={sample}
          onChange={(carriers, kind) => put({ carriers }, kind)}
        />
      )}
      <SettingGroup title="Cap layer" says={capText(capThicknessNm, sample)}>
        <NumberField
          label="Thickness"
          unit="nm"
          hint={
            sample.capThicknessNm === capThicknessNm
              ? 'As the sample says. Depths count from below the cap.'
              : 'Not what the sample says. Depths count from below the cap.'
          }
          value={capThicknessNm}
          range={{ min: 0, max: 10_000 }}
          onChange={(next) => next !== null && put({ capThicknessNm: next }, 'cap')}
        />
      </SettingGroup>
      <ResamplingSettings
        resamples={assumptions.resamples}
        seed={assumptions.seed}
        onChange={put}
      />
    </section>
  );
});

function capText(thicknessNm: number, { capMaterial }: Sample): string {
  return thicknessNm === 0 ? 'none' : [`${thicknessNm} nm`, capMaterial].filter(Boolean).join(', ');
}
