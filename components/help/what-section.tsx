import { Notice } from '@/components/ui/notice';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

export function WhatSection() {
  return (
    <HelpSection id="what" title={titleOf('what')}>
      <p>
        Muons implanted at one energy stop over a broad range of depths, so no point of an energy
        scan is a depth. The depth where the carriers begin, how sharp that edge is, and the
        concentrations on both sides follow only when a trial profile is folded through the stopping
        profiles and compared with the whole scan.
      </p>
      <Notice kind="caution" title="A fitted profile is a model-dependent estimate">
        It holds only within its reach and for the trial profile that was chosen. It gives the
        concentration of carriers, which inside a depletion layer is not the doping. It does not
        replace process qualification.
      </Notice>
    </HelpSection>
  );
}
