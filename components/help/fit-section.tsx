import { Formula } from './formula';
import { HelpSection } from './help-section';
import { titleOf } from './help-topics';
import { Frac, Round, Squared, Sub, Sum } from './math-parts';

export function FitSection() {
  return (
    <HelpSection id="fit" title={titleOf('fit')}>
      <p>
        The fit makes this sum as small as it gets, over the points that are switched on and the
        priors:
      </p>
      <Formula words="capital phi equals the sum over i of y i minus y hat i over sigma i, squared, plus the sum over k of theta k minus m k over sigma k, squared">
        <mi>Φ</mi>
        <mo>=</mo>
        <Sum over="i" />
        <Squared>
          <Ratio value="y" index="i" minus={<Sub base="ŷ" index="i" />} />
        </Squared>
        <mo>+</mo>
        <Sum over="k" />
        <Squared>
          <Ratio value="θ" index="k" minus={<Sub base="m" index="k" />} />
        </Squared>
      </Formula>
      <ul className="grid list-disc gap-1.5 pl-5">
        <li>
          The levels are linear. For any edge they follow from a small linear solve, so the edge is
          searched for over its whole range and the best few places are polished (separable least
          squares, Golub and Pereyra 1973; steps after Levenberg and Marquardt). The answer does not
          depend on a starting guess.
        </li>
        <li>
          Levels keep to what they are: fractions from 0 to 1, rates not below Λ₀; the edge lies
          between the surface and the last bin. A bound that is reached is reported.
        </li>
        <li>
          A parameter is free, held, or carries a Gaussian prior. A prior counts as one more point:
          degrees of freedom are points plus priors minus free parameters.
        </li>
        <li>
          Covariance and correlations come from the analytic derivatives at the minimum. The p-value
          is the upper tail of the χ² distribution (Abramowitz and Stegun, section 26.4).
        </li>
        <li>Points may be switched off. They stay in the scan and are drawn hollow.</li>
      </ul>
    </HelpSection>
  );
}

function Ratio({ value, index, minus }: { value: string; index: string; minus: React.ReactNode }) {
  return (
    <Round tall>
      <Frac
        top={
          <>
            <Sub base={value} index={index} />
            <mo>−</mo>
            {minus}
          </>
        }
        bottom={<Sub base="σ" index={index} />}
      />
    </Round>
  );
}
