import { Formula } from './formula';
import { HelpSection } from './help-section';
import { titleOf } from './help-topics';
import { Frac, Round, Squared } from './math-parts';

export function TrialSection() {
  return (
    <HelpSection id="trial" title={titleOf('trial')}>
      <p>
        A populated share s(x) rises from 0 on the surface side to 1 in the bulk. Under depletion
        the bulk holds the carriers, under accumulation the surface does. The{' '}
        <strong>sharp edge</strong> steps at the edge depth W. The <strong>graded edge</strong> is a
        step blurred by a Gaussian of width w (its σ):
      </p>
      <Formula words="s of x equals one half erfc of W minus x over root two w">
        <mi>s</mi>
        <Round>
          <mi>x</mi>
        </Round>
        <mo>=</mo>
        <Frac top={<mn>1</mn>} bottom={<mn>2</mn>} />
        <mi className="upright">erfc</mi>
        <Round tall>
          <Frac
            top={
              <>
                <mi>W</mi>
                <mo>−</mo>
                <mi>x</mi>
              </>
            }
            bottom={
              <>
                <msqrt>
                  <mn>2</mn>
                </msqrt>
                <mi>w</mi>
              </>
            }
          />
        </Round>
      </Formula>
      <p>Its mean over a bin from l to r, which the fold needs, is exact:</p>
      <Formula words="the mean of s equals G of r minus G of l, over r minus l, with G of x equal to w over root two times z erfc of minus z plus e to the minus z squared over root pi, and z equal to x minus W over root two w">
        <mfrac>
          <mrow>
            <mi>G</mi>
            <Round>
              <mi>r</mi>
            </Round>
            <mo>−</mo>
            <mi>G</mi>
            <Round>
              <mi>l</mi>
            </Round>
          </mrow>
          <mrow>
            <mi>r</mi>
            <mo>−</mo>
            <mi>l</mi>
          </mrow>
        </mfrac>
        <mtext>, </mtext>
        <mi>G</mi>
        <Round>
          <mi>x</mi>
        </Round>
        <mo>=</mo>
        <Frac
          top={<mi>w</mi>}
          bottom={
            <msqrt>
              <mn>2</mn>
            </msqrt>
          }
        />
        <Round tall>
          <mi>z</mi>
          <mi className="upright">erfc</mi>
          <Round>
            <mo>−</mo>
            <mi>z</mi>
          </Round>
          <mo>+</mo>
          <Frac
            top={
              <msup>
                <mi>e</mi>
                <mrow>
                  <mo>−</mo>
                  <Squared>
                    <mi>z</mi>
                  </Squared>
                </mrow>
              </msup>
            }
            bottom={
              <msqrt>
                <mi>π</mi>
              </msqrt>
            }
          />
        </Round>
        <mtext>, </mtext>
        <mi>z</mi>
        <mo>=</mo>
        <Frac
          top={
            <>
              <mi>x</mi>
              <mo>−</mo>
              <mi>W</mi>
            </>
          }
          bottom={
            <>
              <msqrt>
                <mn>2</mn>
              </msqrt>
              <mi>w</mi>
            </>
          }
        />
      </Formula>
      <p className="text-sm text-ink-2">
        erfc as in Abramowitz and Stegun, chapter 7; the integral follows from its section 7.2.
      </p>
    </HelpSection>
  );
}
