import type { Observable } from '@/lib/inversion/index';

import { toggled } from './assumptions';
import { ComparisonPanel } from './comparison-panel';
import { levelHandles } from './level-handles';
import { ScanPanel } from './scan-panel';
import type { DeskFigures } from './use-desk-figures';
import type { FitDesk } from './use-fit-desk';
import type { Hover } from './use-hover';

interface LiveMeasuredProps {
  desk: FitDesk;
  figures: DeskFigures;
  hover: Hover;
  observable: Observable;
  svgName: string;
}

/** The middle column at work: the scan with its handles, and the comparison. */
export function LiveMeasured({ desk, figures, hover, observable, svgName }: LiveMeasuredProps) {
  const { assumptions, change, drawing, fit, comparison } = desk;
  return (
    <>
      <ScanPanel
        points={desk.points}
        interpolatedKeV={figures.interpolatedKeV}
        offInScan={figures.offInScan}
        observable={observable}
        curves={figures.curves}
        drawnCurve={drawing.curve}
        residuals={figures.residuals}
        keep={figures.levels}
        highlightedKeV={hover.energyKeV}
        speakingKeV={hover.speakingKeV}
        onReadEnergy={hover.onReadEnergy}
        edit={{
          levels: desk.prepared
            ? levelHandles({
                values: drawing.values,
                drawn: drawing.drawn,
                answer: figures.answer,
                observable,
                assumptions,
              })
            : [],
          onToggle: (energyKeV) => change((present) => toggled(present, energyKeV)),
          onMove: drawing.move,
          onDrop: drawing.drop,
          onClear: drawing.clear,
        }}
        svgName={svgName}
      />
      <ComparisonPanel
        result={comparison.result}
        busy={comparison.busy}
        error={comparison.error}
        outOfDate={comparison.outOfDate}
        current={fit.good?.input.profile ?? assumptions.profile}
      />
    </>
  );
}
