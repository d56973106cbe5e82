import { formatConcentration } from '@/lib/format';
import type { FitSpec } from '@/lib/schemas/fit';
import type { Sample } from '@/lib/schemas/sample';

import { NumberField } from './number-field';
import { SettingGroup } from './setting-group';

type Carriers = FitSpec['carriers'];

interface CarrierSettingsProps {
  carriers: Carriers;
  polarity: FitSpec['polarity'];
  sample: Pick<Sample, 'carrier' | 'dopingPerCm3' | 'dopingSigmaPerCm3'>;
  onChange: (carriers: Carriers, kind: string) => void;
}

/** The concentrations that turn a populated share into carriers per cm³: assumptions, and said to be. */
export function CarrierSettings({ carriers, polarity, sample, onChange }: CarrierSettingsProps) {
  const fromDoping = carriers.bulkPerCm3 !== null && carriers.bulkPerCm3 === sample.dopingPerCm3;
  return (
    <SettingGroup title={`Bulk ${sample.carrier}`} says={carriersText(carriers)}>
      <p className="text-[0.8125rem] text-ink-3">
        {fromDoping
          ? 'Assumed equal to the doping of the sample. A fraction alone does not give a concentration.'
          : 'An assumption: a fraction alone does not give a concentration. Without it the profile is a populated share.'}
      </p>
      <div className="grid grid-cols-2 gap-2">
        <NumberField
          label="In the bulk"
          unit="cm⁻³"
          value={carriers.bulkPerCm3}
          range={{ above: 0 }}
          optional
          onChange={(bulkPerCm3) => onChange({ ...carriers, bulkPerCm3 }, 'bulk')}
        />
        <NumberField
          label="±"
          unit="cm⁻³"
          value={carriers.bulkSigmaPerCm3}
          range={{ min: 0 }}
          optional
          onChange={(bulkSigmaPerCm3) => onChange({ ...carriers, bulkSigmaPerCm3 }, 'bulk sigma')}
        />
      </div>
      <NumberField
        label="On the surface side"
        unit="cm⁻³"
        hint={
          polarity === 'accumulation'
            ? 'Accumulation needs it for a concentration.'
            : 'Blank means none.'
        }
        value={carriers.topPerCm3}
        range={{ min: 0 }}
        optional
        onChange={(topPerCm3) => onChange({ ...carriers, topPerCm3 }, 'top')}
      />
    </SettingGroup>
  );
}

export function carriersText({ bulkPerCm3, bulkSigmaPerCm3 }: Carriers): string {
  return bulkPerCm3 === null
    ? 'not known: populated share'
    : `${formatConcentration(bulkPerCm3, bulkSigmaPerCm3)}, assumed`;
}
