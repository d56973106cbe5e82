import { Formula } from './formula';
import { HelpSection } from './help-section';
import { titleOf } from './help-topics';
import { Round, Sub, Sum } from './math-parts';

export function ResponseSection() {
  return (
    <HelpSection id="response" title={titleOf('response')}>
      <p>
        The folded value at an energy is the mean over its stops of what the probe sees at each
        depth. With the mass n of a bin, the mean share s̄ in it and the two levels:
      </p>
      <Formula words="y hat i equals the sum over bins b of n i b times level top plus level bulk minus level top, times s bar b">
        <Sub base="ŷ" index="i" />
        <mo>=</mo>
        <Sum over="b" />
        <Sub base="n" index="ib" />
        <Round>
          <Sub base="F" index="top" />
          <mo>+</mo>
          <Round>
            <Sub base="F" index="bulk" />
            <mo>−</mo>
            <Sub base="F" index="top" />
          </Round>
          <Sub base="s̄" index="b" />
        </Round>
      </Formula>
      <p>
        <strong>Two-level fraction.</strong> The diamagnetic fraction switches between its
        carrier-free and its populated level. The levels are free, held, or carry a prior from bulk
        reference runs. Without a bulk concentration the profile is a populated share from 0 to 1.
      </p>
      <p>
        <strong>Capture rate.</strong> The rate is linear in the concentration p, with the capture
        coefficient γ and the rate Λ₀ without carriers:
      </p>
      <Formula words="capital lambda equals gamma p plus lambda zero">
        <mi>Λ</mi>
        <mo>=</mo>
        <mi>γ</mi>
        <mi>p</mi>
        <mo>+</mo>
        <msub>
          <mi>Λ</mi>
          <mn>0</mn>
        </msub>
        <mtext>, so p (cm⁻³) = (Λ − Λ₀) · 10⁶ / γ with rates in µs⁻¹ and γ in cm³ s⁻¹</mtext>
      </Formula>
      <p>
        The uncertainty of γ moves the whole profile at once. It is shown apart and is never part of
        the band. A rule of thumb in germanium near 200 K is 1 µs⁻¹ per 10¹² cm⁻³ (common practice,
        no source).
      </p>
    </HelpSection>
  );
}
