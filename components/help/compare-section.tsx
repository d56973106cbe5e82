import { Formula } from './formula';
import { HelpSection } from './help-section';
import { titleOf } from './help-topics';
import { Frac, Round, Squared } from './math-parts';

export function CompareSection() {
  return (
    <HelpSection id="compare" title={titleOf('compare')}>
      <p>
        Fits of the same points are compared by AICc (Hurvich and Tsai 1989) with k free parameters
        and n points and priors. The weight is the evidence for one fit among those listed (Burnham
        and Anderson 2002). Fits of different points are never weighed against each other.
      </p>
      <Formula words="A I C c equals chi squared plus two k plus two k times k plus one over n minus k minus one">
        <mi className="upright">AICc</mi>
        <mo>=</mo>
        <Squared>
          <mi>χ</mi>
        </Squared>
        <mo>+</mo>
        <mn>2</mn>
        <mi>k</mi>
        <mo>+</mo>
        <Frac
          top={
            <>
              <mn>2</mn>
              <mi>k</mi>
              <Round>
                <mi>k</mi>
                <mo>+</mo>
                <mn>1</mn>
              </Round>
            </>
          }
          bottom={
            <>
              <mi>n</mi>
              <mo>−</mo>
              <mi>k</mi>
              <mo>−</mo>
              <mn>1</mn>
            </>
          }
        />
        <mtext>, BIC = χ² + k ln n, weight ∝ exp(−½ ΔAICc)</mtext>
      </Formula>
      <p>
        <strong>Sharp against graded.</strong> A width of zero lies on the boundary, so the fall of
        χ² from sharp to graded, T, follows an even mixture of χ² with 0 and with 1 degree of
        freedom (Self and Liang 1987):
      </p>
      <Formula words="p equals one half P of chi squared one greater than T, equal to one half erfc of the root of T over two">
        <mi>p</mi>
        <mo>=</mo>
        <Frac top={<mn>1</mn>} bottom={<mn>2</mn>} />
        <mi>P</mi>
        <Round>
          <msubsup>
            <mi>χ</mi>
            <mn>1</mn>
            <mn>2</mn>
          </msubsup>
          <mo>&gt;</mo>
          <mi>T</mi>
        </Round>
        <mo>=</mo>
        <Frac top={<mn>1</mn>} bottom={<mn>2</mn>} />
        <mi className="upright">erfc</mi>
        <msqrt>
          <mi>T</mi>
          <mo>/</mo>
          <mn>2</mn>
        </msqrt>
      </Formula>
    </HelpSection>
  );
}
