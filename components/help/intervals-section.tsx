import { DEFAULT_RESAMPLES, DELTA_CHI_SQUARE_68, DELTA_CHI_SQUARE_95 } from '@/lib/inversion/index';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

export function IntervalsSection() {
  return (
    <HelpSection id="intervals" title={titleOf('intervals')}>
      <p>
        <strong>Edge depth and width</strong> carry profile-likelihood intervals: the values at
        which Φ, with everything else fitted anew, has risen by {DELTA_CHI_SQUARE_68} (68 %) or{' '}
        {DELTA_CHI_SQUARE_95.toFixed(2)} (95 %, the quantile of χ² with one degree of freedom). The
        two sides may differ. Where Φ never rises far enough on one side the result is one-sided and
        reads, for example, “deeper than 112 nm (95 %)”. A single ± is shown only where both sides
        are closed, no bound is reached, and it agrees with the interval within a third.
      </p>
      <p>
        <strong>Bands</strong> of the carrier profile come from a parametric bootstrap (Efron and
        Tibshirani 1993): {DEFAULT_RESAMPLES.toLocaleString('en')} scans are drawn from the fit with
        the stated σ, priors and nuisances drawn too, each is fitted, and the band holds the middle
        68 % or 95 % of the profiles at each depth. The seed is stored, so a band can be drawn again
        exactly. Until it is there, the band by linear error propagation stands in for it and says
        so.
      </p>
    </HelpSection>
  );
}
