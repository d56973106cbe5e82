'use client';

import { useMemo } from 'react';

import { Button } from '@/components/ui/button';
import { ButtonLink } from '@/components/ui/button-link';
import { InventedMark } from '@/components/ui/invented-mark';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import type { Sample } from '@/lib/schemas/sample';
import type { Scan } from '@/lib/schemas/scan';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

import { AlsoAssumed } from './also-assumed';
import { freed, held, specOf, toggled, withSetting, type Assumptions } from './assumptions';
import { ChecksList } from './checks-list';
import { ComparisonPanel } from './comparison-panel';
import { DepthPanel } from './depth-panel';
import { DeskColumns } from './desk-columns';
import { arrowStep } from './drawn-values';
import { DrawnNote } from './drawn-note';
import { figureName } from './figure-name';
import { FitBar } from './fit-bar';
import { levelHandles } from './level-handles';
import { ParameterTable } from './parameter-table';
import { ProfileChoice } from './profile-choice';
import { profileKind } from './profile-kinds';
import { profileSeries, residualSeries, scaleErrorOf } from './profile-series';
import { responseText } from './response-settings';
import { SaveFit } from './save-fit';
import { ScanPanel } from './scan-panel';
import { scanSentence } from './scan-sentence';
import { useScan } from './use-desk-data';
import { useDeskKeys } from './use-desk-keys';
import { useFitDesk } from './use-fit-desk';
import { useHover } from './use-hover';

export interface FitDeskProps {
  scan: Scan;
  sample: Sample;
  stoppingSets: readonly StoppingSetRow[];
  usual: Assumptions;
  /** The fit that this one comes from. */
  parent: { id: string; name: string; scanChangedSince: boolean } | null;
  maySave: boolean;
}

/** The fit desk at work: assumed, measured, follows. */
export function FitDesk({
  scan: start,
  sample,
  stoppingSets,
  usual,
  parent,
  maySave,
}: FitDeskProps) {
  const scan = useScan(start);
  const desk = useFitDesk(scan, usual);
  const { assumptions, change, fit, drawing, points, ridges, comparison, outOfDate } = desk;
  const good = fit.good;
  const answer = good?.first.answer ?? null;
  const capThicknessNm = assumptions.capThicknessNm;
  const depthScale = drawing.values.depthScale ?? 1;
  const hover = useHover(ridges, points, { depthScale, capThicknessNm });
  useDeskKeys((key) => ({ fit: desk.startFit, undo: desk.undo, redo: desk.redo })[key]());

  const offInScan = useMemo(
    () => new Set(scan.points.filter(({ enabled }) => !enabled).map(({ energyKeV }) => energyKeV)),
    [scan.points],
  );
  const interpolatedKeV = useMemo(
    () => ridges.filter(({ interpolated }) => interpolated).map(({ energyKeV }) => energyKeV),
    [ridges],
  );
  const compared = useMemo(
    () => (comparison.outOfDate ? [] : (comparison.result?.fits ?? [])),
    [comparison.outOfDate, comparison.result],
  );
  const main = useMemo(
    () =>
      good ? { kind: good.input.profile, profile: good.profile, answer: good.first.answer } : null,
    [good],
  );
  const profiles = useMemo(() => profileSeries(main, compared), [main, compared]);
  const residuals = useMemo(() => residualSeries(main, compared), [main, compared]);
  const curves = useMemo(
    () => [desk.fitted, ...desk.others].filter((curve) => curve !== null),
    [desk.fitted, desk.others],
  );
  const keep = useMemo(
    () =>
      (answer?.parameters ?? [])
        .filter(({ name }) => name === 'levelTop' || name === 'levelBulk')
        .map(({ value }) => value),
    [answer],
  );
  const edgeParameter = answer?.parameters.find(({ name }) => name === 'edgeDepthNm') ?? null;
  const edgeValue = drawing.values.edgeDepthNm;
  const limitNm = desk.prepared?.deepestNm ?? 0;
  const uncovered = desk.obstacle;
  const carriesUnit = good?.profile.unit === 'cm⁻³';

  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: sample.name, href: `/samples/${sample.id}` },
          { label: scan.name, href: `/scans/${scan.id}` },
        ]}
        title={parent ? `New fit, from ${parent.name}` : 'New fit'}
        badge={scan.invented && <InventedMark />}
        meta={[
          scanSentence(scan),
          desk.stopping.answer && `stopping set “${desk.stopping.answer.name}”`,
          responseText(assumptions.response),
        ]}
        actions={
          <>
            <Button variant="quiet" onClick={desk.undo} disabled={!desk.canUndo} title="Ctrl+Z">
              Undo
            </Button>
            <Button variant="quiet" onClick={desk.redo} disabled={!desk.canRedo} title="Ctrl+Y">
              Redo
            </Button>
            {maySave && (
              <SaveFit
                fit={
                  good?.complete && !outOfDate && assumptions.stoppingSetId
                    ? {
                        scanId: scan.id,
                        stoppingSetId: assumptions.stoppingSetId,
                        parentFitId: parent?.id ?? null,
                        spec: specOf(assumptions),
                        claimed: { answer: good.first.answer, profile: good.profile },
                      }
                    : null
                }
                waitsFor={
                  outOfDate
                    ? 'Fit again first: something changed since.'
                    : good?.complete
                      ? null
                      : 'The fit is not finished yet.'
                }
                suggestedName={`${profileKind(assumptions.profile).label}, ${scan.name}`.slice(
                  0,
                  80,
                )}
              />
            )}
          </>
        }
      />
      <DeskNotices
        unread={desk.unread}
        parent={parent}
        stoppingError={desk.stopping.error}
        noSets={stoppingSets.length === 0}
      />
      <DeskColumns
        assumed={
          <form
            className="grid gap-5"
            aria-label="Assumptions"
            onSubmit={(event) => {
              event.preventDefault();
              desk.startFit();
            }}
          >
            <ProfileChoice
              value={assumptions.profile}
              onChange={(profile) => change((present) => ({ ...present, profile }))}
            />
            <ParameterTable
              assumptions={assumptions}
              observable={scan.observable}
              answer={answer}
              drawn={drawing.drawn}
              outOfDate={outOfDate}
              edit={{
                hold: (name, isHeld) =>
                  change((present) =>
                    isHeld ? held(present, name, drawing.values[name] ?? 0) : freed(present, name),
                  ),
                change: (name, setting, kind) =>
                  change((present) => withSetting(present, name, setting), kind),
              }}
            />
            <FitBar
              fit={fit}
              outOfDate={outOfDate}
              obstacle={uncovered}
              loading={desk.stopping.loading}
              comparing={comparison.busy}
              onCompare={desk.compareAll}
            />
            <AlsoAssumed
              assumptions={assumptions}
              scan={scan}
              sample={sample}
              points={points}
              sets={stoppingSets}
              interpolatedKeV={interpolatedKeV}
              warnings={desk.stopping.answer?.warnings ?? []}
              change={change}
            />
            <ChecksList checks={good?.checks ?? []} outOfDate={outOfDate} />
          </form>
        }
        measured={
          <>
            <ScanPanel
              points={points}
              interpolatedKeV={interpolatedKeV}
              offInScan={offInScan}
              observable={scan.observable}
              curves={curves}
              drawnCurve={drawing.curve}
              residuals={residuals}
              keep={keep}
              highlightedKeV={hover.energyKeV}
              speakingKeV={hover.speakingKeV}
              onReadEnergy={hover.onReadEnergy}
              edit={{
                levels: desk.prepared
                  ? levelHandles({
                      values: drawing.values,
                      drawn: drawing.drawn,
                      answer,
                      observable: scan.observable,
                      assumptions,
                    })
                  : [],
                onToggle: (energyKeV) => change((present) => toggled(present, energyKeV)),
                onMove: drawing.move,
                onDrop: drawing.drop,
                onClear: drawing.clear,
              }}
              svgName={figureName(sample.name, scan.name)}
            />
            <ComparisonPanel
              comparison={comparison}
              current={good?.input.profile ?? assumptions.profile}
            />
          </>
        }
        follows={
          <DepthPanel
            ridges={ridges}
            points={points}
            profiles={profiles}
            information={good?.first.information ?? null}
            answer={answer}
            carrier={sample.carrier}
            polarity={good?.input.polarity ?? assumptions.polarity}
            capThicknessNm={capThicknessNm}
            depthScale={depthScale}
            scaleError={carriesUnit ? scaleErrorOf(assumptions.response) : null}
            outOfDate={outOfDate}
            highlightedKeV={hover.energyKeV}
            speakingKeV={hover.speakingKeV}
            onReadEnergy={hover.onReadEnergy}
            readDepthNm={hover.depthNm}
            onReadDepth={hover.onReadDepth}
            handle={{
              edge:
                edgeValue === undefined || !desk.prepared
                  ? null
                  : {
                      valueNm: edgeValue,
                      isDrawn: drawing.drawn.edgeDepthNm !== undefined,
                      stepNm: arrowStep(edgeParameter, limitNm),
                      limitNm,
                    },
              onMove: drawing.move,
              onDrop: drawing.drop,
              onClear: drawing.clear,
              note:
                drawing.chiSquare === null ? null : <DrawnNote drawing={drawing} fitted={answer} />,
            }}
            svgName={`${figureName(sample.name, scan.name)}-depth`}
          />
        }
      />
    </>
  );
}

function DeskNotices({
  unread,
  parent,
  stoppingError,
  noSets,
}: {
  unread: readonly string[];
  parent: FitDeskProps['parent'];
  stoppingError: string | null;
  noSets: boolean;
}) {
  return (
    <div className="grid gap-2 pt-3 empty:hidden">
      {unread.length > 0 && (
        <Notice kind="caution">
          Parts of this address could not be read and were left as usual: {unread.join(', ')}.
        </Notice>
      )}
      {parent?.scanChangedSince && (
        <Notice kind="information">
          The scan was edited after “{parent.name}” was frozen: this desk shows the points as they
          are now.
        </Notice>
      )}
      {stoppingError !== null && (
        <Notice kind="problem">The stopping set could not be read: {stoppingError}</Notice>
      )}
      {noSets && (
        <Notice
          kind="information"
          title="No stopping set yet"
          action={
            <ButtonLink href="/stopping/new" size="small">
              Add a stopping set
            </ButtonLink>
          }
        >
          A fit folds the trial profile through the stopping profiles of the layer stack.
        </Notice>
      )}
    </div>
  );
}
