import { DEPTH_SCALE_PRIOR } from '@/lib/inversion/index';

import { Formula } from './formula';
import { HelpSection } from './help-section';
import { titleOf } from './help-topics';
import { Round, Sub } from './math-parts';

export function StoppingSection() {
  return (
    <HelpSection id="stopping" title={titleOf('stopping')}>
      <p>
        A stopping profile is a histogram over depth for one implantation energy. On the way in it
        becomes a mass per bin that sums to one over the muons that stopped in the bins; the share
        that did not (scattered back, or past the last bin) is kept as its own number. Within a bin
        the density is uniform, so the cumulative share is piecewise linear and every fold is exact,
        not a quadrature. Centres become edges at midpoints.
      </p>
      <p>
        An energy without a profile of its own is interpolated between its two neighbours by
        quantiles, never extrapolated, and marked wherever it shows:
      </p>
      <Formula words="Q of u at E equals one minus t, times Q of u at E 1, plus t times Q of u at E 2, with t linear in the logarithm of energy">
        <mi>Q</mi>
        <Round>
          <mi>u</mi>
          <mo>;</mo>
          <mi>E</mi>
        </Round>
        <mo>=</mo>
        <Round>
          <mn>1</mn>
          <mo>−</mo>
          <mi>t</mi>
        </Round>
        <mi>Q</mi>
        <Round>
          <mi>u</mi>
          <mo>;</mo>
          <Sub base="E" index="1" />
        </Round>
        <mo>+</mo>
        <mi>t</mi>
        <mi>Q</mi>
        <Round>
          <mi>u</mi>
          <mo>;</mo>
          <Sub base="E" index="2" />
        </Round>
        <mtext>, t linear in ln E</mtext>
      </Formula>
      <p>
        The <strong>depth scale</strong> <i>a</i> stretches all depths, x → a·x: the systematic
        error of the stopping calculation. It is held at 1, or set free with a prior of{' '}
        {DEPTH_SCALE_PRIOR.mean.toFixed(2)} ± {DEPTH_SCALE_PRIOR.sigma} unless you say otherwise
        (common practice, no source). A <strong>cap layer</strong> of thickness d has a level of its
        own; depths of the carrier profile count from below it, x − d.
      </p>
    </HelpSection>
  );
}
