'use client';

import { DepthFigure } from '@/components/charts/depth-figure';
import { Figure } from '@/components/charts/figure';
import { ResidualChart } from '@/components/charts/residual-chart';
import { ScanChart } from '@/components/charts/scan-chart';
import { withDecimals } from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';

import { carrierTable, scanFitTable } from './fit-tables';
import { captureScaleError } from './scale-error';
import type { SavedFitFigures } from './saved-fit-figures';

/** What the figures need of a fit: it travels to the browser. */
export type DrawnFit = Pick<Fit, 'name' | 'observable' | 'spec' | 'carrierProfile' | 'edge'> & {
  residuals: Fit['answer']['residuals'];
  depthScale: number;
};

interface FitFiguresProps {
  fit: DrawnFit;
  figures: SavedFitFigures;
  carrier: 'electrons' | 'holes';
  fileName: string;
  /** The point that a comment speaks of. */
  litKeV?: number | null;
}

const DEPTH_HEIGHT = 520;
const SCAN_HEIGHT = 300;
const RESIDUAL_HEIGHT = 120;

/** Stopping profiles, carriers and reach over one depth axis. */
export function SavedDepthFigure({ fit, figures, carrier, fileName, litKeV }: FitFiguresProps) {
  const { edge, carrierProfile, spec } = fit;
  const edgeWords = edge ? `edge ${withDecimals(edge.value, 1)} nm` : undefined;
  return (
    <Figure
      title="Depth"
      svgName={`${fileName}-depth`}
      height={DEPTH_HEIGHT}
      table={carrierTable(carrierProfile)}
    >
      {(width) => (
        <DepthFigure
          ridges={figures.ridges}
          profiles={[{ label: `${spec.profile} edge`, style: 'solid', profile: carrierProfile }]}
          information={figures.information}
          edgeNm={edge?.value ?? null}
          edgeLabel={edgeWords}
          edgeInterval={edge?.interval68}
          carrier={carrier}
          highlightedKeV={litKeV}
          depthScale={fit.depthScale}
          capThicknessNm={spec.capThicknessNm}
          maxDepthNm={carrierProfile.points.at(-1)?.depthNm ?? carrierProfile.reachNm}
          scaleError={captureScaleError(spec)}
          description={`Stopping profiles, ${carrier} and reach over depth; ${edgeWords ?? 'no edge'}, reach ${withDecimals(carrierProfile.reachNm, 0)} nm.`}
          width={width}
          height={DEPTH_HEIGHT}
        />
      )}
    </Figure>
  );
}

/** The scan with its folded curve, and the residuals under it. */
export function SavedScanFigure({
  fit,
  figures,
  fileName,
  litKeV,
}: Omit<FitFiguresProps, 'carrier'>) {
  const { residuals, observable, spec } = fit;
  const label = `${spec.profile} edge`;
  return (
    <div className="grid min-w-0 content-start gap-4">
      <Figure
        title="Energy scan"
        svgName={`${fileName}-scan`}
        height={SCAN_HEIGHT}
        table={scanFitTable(residuals)}
      >
        {(width) => (
          <ScanChart
            residuals={residuals}
            curves={[{ label, style: 'solid', ...figures.curve }]}
            observable={observable}
            highlightedKeV={litKeV}
            width={width}
            height={SCAN_HEIGHT}
          />
        )}
      </Figure>
      <Figure
        title="Residuals"
        svgName={`${fileName}-residuals`}
        height={RESIDUAL_HEIGHT}
        table={scanFitTable(residuals)}
      >
        {(width) => (
          <ResidualChart
            series={[{ label, style: 'solid', residuals }]}
            highlightedKeV={litKeV}
            width={width}
            height={RESIDUAL_HEIGHT}
          />
        )}
      </Figure>
    </div>
  );
}
