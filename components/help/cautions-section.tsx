import { Notice } from '@/components/ui/notice';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

export function CautionsSection() {
  return (
    <HelpSection id="cautions" title={titleOf('cautions')}>
      <Notice kind="caution" title="Lamps and lasers">
        Ultraviolet lamps and lasers follow the facility’s laser-safety rules. Ask its laser-safety
        officer before light goes on a sample.
      </Notice>
      <Notice kind="caution" title="Beam time">
        Radiation areas, cryogens and high voltage are governed by the facility and its licensed
        staff. Nothing on these pages overrides them.
      </Notice>
      <Notice kind="caution" title="Use of a profile">
        A fitted profile is a model-dependent estimate, valid only within its reach; it does not
        replace process qualification.
      </Notice>
    </HelpSection>
  );
}
