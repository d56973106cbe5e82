import { Mark } from '@/components/ui/mark';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

export function ChecksSection() {
  return (
    <HelpSection id="checks" title={titleOf('checks')}>
      <p>
        Every fit carries its checks, each with a sentence and the figure behind it. They look at
        the number of points, at χ² both ways, at runs of residuals of one sign, at bounds, strong
        correlations, the reach, the stopping set (energies that are interpolated, losses, coarse
        bins), the depth-scale prior, and at single points that carry the result.
      </p>
      <ul className="grid gap-1.5">
        <li className="flex gap-2.5">
          <Mark kind="fine" className="mt-1" />{' '}
          <span>
            <strong>Fine</strong>: nothing to see.
          </span>
        </li>
        <li className="flex gap-2.5">
          <Mark kind="caution" className="mt-1" />
          <span>
            <strong>Caution</strong>: the result may stand, but read the sentence and say so in the
            notes.
          </span>
        </li>
        <li className="flex gap-2.5">
          <Mark kind="problem" className="mt-1" />
          <span>
            <strong>Problem</strong>: the profile does not describe these data, or the numbers do
            not mean what they seem to.
          </span>
        </li>
      </ul>
    </HelpSection>
  );
}
