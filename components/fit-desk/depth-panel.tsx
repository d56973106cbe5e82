'use client';

import { memo, useMemo, type ReactNode } from 'react';

import type { DepthInformation, ProfileSeries, Ridge } from '@/components/charts/chart-types';
import { DepthFigure } from '@/components/charts/depth-figure';
import { depthLimit } from '@/components/charts/depth-layout';
import { Figure } from '@/components/charts/figure';
import { parameterParts } from '@/components/review/parameter-value';
import { asEntered, significant, withDecimals } from '@/lib/format';
import type { FitAnswer, FitParameter, ScanPoint } from '@/lib/inversion/index';

import { AnswerHeadline } from './answer-headline';
import { DepthOverlay, type DepthOverlayProps } from './depth-overlay';
import { depthTable } from './figure-tables';
import { profileAt, voicesAt } from './linked-depth';

/** Drawn anew only when something in it changed: not while the edge is dragged. */
const StillDepthFigure = memo(DepthFigure);

const HEIGHT = 580;
const NOTHING: readonly ProfileSeries[] = [];

interface DepthPanelProps {
  ridges: readonly Ridge[];
  points: readonly ScanPoint[];
  /** The fit first, then what it is compared with. */
  profiles: readonly ProfileSeries[];
  information: DepthInformation | null;
  answer: FitAnswer | null;
  carrier: 'electrons' | 'holes';
  polarity: 'depletion' | 'accumulation';
  capThicknessNm: number;
  depthScale: number;
  scaleError: number | null;
  outOfDate: boolean;
  highlightedKeV: number | null;
  onReadEnergy: (energyKeV: number | null) => void;
  readDepthNm: number | null;
  onReadDepth: (depthNm: number | null) => void;
  /** Energies that speak about the depth pointed at. */
  speakingKeV: readonly number[] | null;
  /** The handle; null on a saved fit. */
  handle:
    | null
    | (Pick<DepthOverlayProps, 'edge' | 'onMove' | 'onDrop' | 'onClear'> & {
        note: ReactNode;
      });
  svgName: string;
}

/** What follows: the one number, and the three panels over one depth axis. */
export function DepthPanel(props: DepthPanelProps) {
  const { ridges, points, profiles, answer, carrier, capThicknessNm, depthScale, readDepthNm } =
    props;
  const edge = answer?.parameters.find(({ name }) => name === 'edgeDepthNm') ?? null;
  const width = answer?.parameters.find(({ name }) => name === 'edgeWidthNm') ?? null;
  const main = profiles[0]?.profile ?? null;
  const maxDepthNm = useMemo(
    () => depthLimit(ridges, profiles, { depthScale, capThicknessNm }),
    [ridges, profiles, depthScale, capThicknessNm],
  );
  const table = useMemo(
    () => (main ? depthTable(main, carrier) : { columns: [], rows: [] }),
    [main, carrier],
  );
  const edgeText = edge
    ? edge.held
      ? `edge held at ${asEntered(edge.value)} nm`
      : `edge ${parameterParts(edge, 'nm').sentence}`
    : undefined;
  return (
    <Figure
      title="Depth"
      table={table}
      svgName={props.svgName}
      height={HEIGHT}
      lead={
        <AnswerHeadline
          edge={edge}
          width={width}
          polarity={props.polarity}
          outOfDate={props.outOfDate}
        />
      }
      foot={
        <p className="min-h-10 text-[0.8125rem] text-ink-2">
          {props.handle?.note ?? <Reading {...props} />}
        </p>
      }
    >
      {(figureWidth) => (
        <div className="relative">
          <StillDepthFigure
            ridges={ridges}
            profiles={profiles.length > 0 ? profiles : NOTHING}
            information={props.information}
            edgeNm={edge?.value ?? null}
            edgeLabel={
              edge
                ? `${props.handle?.edge?.isDrawn ? 'fitted edge' : 'edge'} ${shortValue(edge)} nm`
                : undefined
            }
            edgeInterval={edge && !edge.held ? edge.interval68 : undefined}
            carrier={carrier}
            depthScale={depthScale}
            capThicknessNm={capThicknessNm}
            maxDepthNm={maxDepthNm}
            scaleError={props.scaleError}
            highlightedKeV={props.highlightedKeV}
            speakingKeV={props.speakingKeV}
            description={describe({
              ridges,
              points,
              carrier,
              edgeText,
              reachNm: main?.reachNm ?? null,
            })}
            width={figureWidth}
            height={HEIGHT}
          />
          <DepthOverlay
            width={figureWidth}
            height={HEIGHT}
            capThicknessNm={capThicknessNm}
            maxDepthNm={maxDepthNm}
            ridges={ridges}
            edge={props.handle?.edge ?? null}
            readDepthNm={readDepthNm}
            onMove={props.handle?.onMove ?? ignore}
            onDrop={props.handle?.onDrop ?? ignore}
            onClear={props.handle?.onClear ?? ignore}
            onReadDepth={props.onReadDepth}
            onReadEnergy={props.onReadEnergy}
          />
        </div>
      )}
    </Figure>
  );
}

/** The value as beside its interval; three digits where an interval does not set them. */
function shortValue(edge: FitParameter): string {
  const parts = parameterParts(edge, 'nm');
  return edge.held || parts.plus === null ? significant(edge.value) : parts.value;
}

const ignore = () => {};

/** What the figure says at the depth pointed at; how to point when nothing is. */
function Reading({
  readDepthNm,
  profiles,
  ridges,
  points,
  depthScale,
  capThicknessNm,
  carrier,
  handle,
}: DepthPanelProps) {
  const main = profiles[0]?.profile ?? null;
  if (readDepthNm === null)
    return (
      <>
        Point at a depth to see which energies speak about it, at a ridge to find its point.{' '}
        {main && handle ? 'Drag the edge, or move it with the arrow keys.' : ''}
      </>
    );
  if (readDepthNm < 0)
    return <>{withDecimals(-readDepthNm, 1)} nm above the semiconductor: the cap layer.</>;
  const sigmas = new Map(
    points.filter(({ enabled }) => enabled).map(({ energyKeV, sigma }) => [energyKeV, sigma]),
  );
  const voices = voicesAt(readDepthNm, ridges, sigmas, { depthScale, capThicknessNm });
  const share = voices.reduce((sum, voice) => sum + voice.share, 0);
  const here = main ? profileAt(main, readDepthNm) : null;
  const unit = main?.unit === 'cm⁻³' ? ` ${carrier} cm⁻³` : ' populated share';
  return (
    <>
      <span className="figures text-ink">{withDecimals(readDepthNm, 1)} nm</span>
      {here && (
        <>
          {': '}
          <span className="figures text-ink">{significant(here.value, 2)}</span>
          {here.lower68 !== null &&
            here.upper68 !== null &&
            ` (${significant(here.lower68, 2)} to ${significant(here.upper68, 2)}, 68 %)`}
          {unit}
          {here.flag !== 'supported' && `, ${here.flag}`}
        </>
      )}
      {voices.length > 0
        ? `. Loudest: ${voices
            .map(({ energyKeV }) => energyKeV)
            .sort((a, b) => a - b)
            .join(', ')} keV, ${(share * 100).toFixed(0)} % of what is said here.`
        : '. No energy stops here.'}
    </>
  );
}

function describe({
  ridges,
  points,
  carrier,
  edgeText,
  reachNm,
}: {
  ridges: readonly Ridge[];
  points: readonly ScanPoint[];
  carrier: string;
  edgeText?: string;
  reachNm: number | null;
}): string {
  const energies = points.map(({ energyKeV }) => energyKeV);
  const stopping =
    ridges.length > 0
      ? `Stopping profiles of ${ridges.length} energies, ${Math.min(...energies)} to ${Math.max(...energies)} keV`
      : 'No stopping profiles yet';
  const result = edgeText
    ? `${carrier} with the ${edgeText}; the scan reaches ${reachNm === null ? 'an unknown depth' : `${reachNm.toFixed(0)} nm`}`
    : 'no fit yet';
  return `${stopping}, over ${result}.`;
}
