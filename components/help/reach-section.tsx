import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

export function ReachSection() {
  return (
    <HelpSection id="reach" title={titleOf('reach')}>
      <p>
        <strong>Beyond reach</strong> are depths below the 95 % stopping quantile of the deepest
        energy that was used: almost no muon stopped there. <strong>Below the floor</strong> are
        concentrations so small that, spread over the whole poor side of the edge, they would not
        move any point by its σ: the least of σ / (γ · C), or σ / (|ΔF| · C), over the points, with
        C the share of stops on that side. Both are hatched in the figure and flagged in every
        export.
      </p>
      <p>
        The strip under the depth figure shows how much the scan knows about the carriers at each
        depth: the sum over the points of (stopping density / σ)², the Fisher information of a thin
        layer, relative to its largest value.
      </p>
    </HelpSection>
  );
}
