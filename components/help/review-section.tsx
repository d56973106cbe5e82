import { AGREEMENT_TOLERANCE } from '@/lib/inversion/index';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

export function ReviewSection() {
  return (
    <HelpSection id="review" title={titleOf('review')}>
      <p>
        A saved fit is frozen with its points, its stopping set and their SHA-256. The server
        computes it again from what it has stored and refuses a fit whose numbers differ by more
        than {AGREEMENT_TOLERANCE.toExponential().replace('e-', ' × 10⁻').replace('⁻6', '⁻⁶')},
        relative, saying which one. A change is a new fit that names the one it came from.
      </p>
      <p>
        A fit goes from draft to review, and is accepted or returned with reasons. Nobody decides on
        a fit of their own. An accepted fit becomes an issued profile with a number of the team; it
        does not change any more. Its CSV follows RFC 4180, with a head of # lines: identity,
        citation, units, parameters with intervals, checks and hashes.
      </p>
    </HelpSection>
  );
}
