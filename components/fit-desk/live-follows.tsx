import { DepthPanel } from './depth-panel';
import { arrowStep } from './drawn-values';
import { DrawnNote } from './drawn-note';
import { scaleErrorOf } from './profile-series';
import type { DeskFigures } from './use-desk-figures';
import type { FitDesk } from './use-fit-desk';
import type { Hover } from './use-hover';

interface LiveFollowsProps {
  desk: FitDesk;
  figures: DeskFigures;
  hover: Hover;
  carrier: 'electrons' | 'holes';
  depthScale: number;
  svgName: string;
}

/** The right column at work: the answer, and the depth figure with the edge to drag. */
export function LiveFollows({
  desk,
  figures,
  hover,
  carrier,
  depthScale,
  svgName,
}: LiveFollowsProps) {
  const { assumptions, drawing, prepared } = desk;
  const { good } = desk.fit;
  const { answer } = figures;
  const valueNm = drawing.values.edgeDepthNm;
  const limitNm = prepared?.deepestNm ?? 0;
  const edgeParameter = answer?.parameters.find(({ name }) => name === 'edgeDepthNm') ?? null;
  return (
    <DepthPanel
      ridges={desk.ridges}
      points={desk.points}
      profiles={figures.profiles}
      information={good?.first.information ?? null}
      answer={answer}
      carrier={carrier}
      polarity={good?.input.polarity ?? assumptions.polarity}
      capThicknessNm={assumptions.capThicknessNm}
      depthScale={depthScale}
      scaleError={scaleErrorOf(assumptions.response)}
      outOfDate={desk.outOfDate}
      highlightedKeV={hover.energyKeV}
      speakingKeV={hover.speakingKeV}
      onReadEnergy={hover.onReadEnergy}
      readDepthNm={hover.depthNm}
      onReadDepth={hover.onReadDepth}
      handle={{
        edge:
          valueNm === undefined || !prepared
            ? null
            : {
                valueNm,
                isDrawn: drawing.drawn.edgeDepthNm !== undefined,
                stepNm: arrowStep(edgeParameter, limitNm),
                limitNm,
              },
        onMove: drawing.move,
        onDrop: drawing.drop,
        onClear: drawing.clear,
        note: drawing.chiSquare === null ? null : <DrawnNote drawing={drawing} fitted={answer} />,
      }}
      svgName={`${svgName}-depth`}
    />
  );
}
