import { formatWithInterval } from '@/lib/format';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

const TWO_SIDED = formatWithInterval(78.412, [76.51, 80.52], null, 'nm').sentence;
const SYMMETRIC = formatWithInterval(0.7421, [0.7381, 0.7461], null).sentence;

export function DigitsSection() {
  return (
    <HelpSection id="digits" title={titleOf('digits')}>
      <p>
        A number is rounded to what its uncertainty supports, by the rule of the Particle Data
        Group: of the three leading digits of the uncertainty, 100 to 354 keeps two digits, 355 to
        949 one, and 950 to 999 rounds up to 1000 and keeps two. So a depth reads{' '}
        <span className="figures whitespace-nowrap">{TWO_SIDED}</span>, and a symmetric result{' '}
        <span className="figures whitespace-nowrap">{SYMMETRIC}</span>, with the uncertainty in
        units of the last digit. All digits show on hover and travel with a copy. Times are shown in
        your zone and stored in UTC.
      </p>
    </HelpSection>
  );
}
