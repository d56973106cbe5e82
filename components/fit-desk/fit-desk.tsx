'use client';

import { Button } from '@/components/ui/button';
import { InventedMark } from '@/components/ui/invented-mark';
import { PageHeader } from '@/components/ui/page-header';
import type { Sample } from '@/lib/schemas/sample';
import type { Scan } from '@/lib/schemas/scan';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

import type { Assumptions } from './assumptions';
import { DeskColumns } from './desk-columns';
import { DeskNotices } from './desk-notices';
import { figureName } from './figure-name';
import { leastUncovered } from './fit-input';
import { fitToSave } from './fit-to-save';
import { LiveAssumed } from './live-assumed';
import { LiveFollows } from './live-follows';
import { LiveMeasured } from './live-measured';
import { profileKind } from './profile-kinds';
import { responseText } from './response-settings';
import { SaveFit } from './save-fit';
import { scanSentence } from './scan-sentence';
import { useScan } from './use-desk-data';
import { useDeskFigures } from './use-desk-figures';
import { useDeskKeys } from './use-desk-keys';
import { useFitDesk } from './use-fit-desk';
import { useHover } from './use-hover';

interface FitDeskProps {
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
  const figures = useDeskFigures(desk, scan);
  const { assumptions, stopping } = desk;
  const depthScale = desk.drawing.values.depthScale ?? 1;
  const hover = useHover(desk.ridges, desk.points, {
    depthScale,
    capThicknessNm: assumptions.capThicknessNm,
  });
  useDeskKeys((key) => ({ fit: desk.startFit, undo: desk.undo, redo: desk.redo })[key]());
  const svgName = figureName(sample.name, scan.name);
  const saving = fitToSave({
    scanId: scan.id,
    parentFitId: parent?.id ?? null,
    assumptions,
    good: desk.fit.good,
    outOfDate: desk.outOfDate,
  });

  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: 'Fits', href: '/fits' },
          { label: sample.name, href: `/samples/${sample.id}` },
          { label: scan.name, href: `/scans/${scan.id}` },
        ]}
        title={parent ? `New fit, from ${parent.name}` : 'New fit'}
        badge={scan.invented && <InventedMark />}
        meta={[
          scanSentence(scan),
          stopping.answer && `stopping set “${stopping.answer.name}”`,
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
                {...saving}
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
        stoppingError={stopping.error}
        noSets={stoppingSets.length === 0}
        uncoveredKeV={leastUncovered(desk.points, stoppingSets)}
      />
      <DeskColumns
        assumed={
          <LiveAssumed
            desk={desk}
            figures={figures}
            scan={scan}
            sample={sample}
            stoppingSets={stoppingSets}
          />
        }
        measured={
          <LiveMeasured
            desk={desk}
            figures={figures}
            hover={hover}
            observable={scan.observable}
            svgName={svgName}
          />
        }
        follows={
          <LiveFollows
            desk={desk}
            figures={figures}
            hover={hover}
            carrier={sample.carrier}
            depthScale={depthScale}
            svgName={svgName}
          />
        }
      />
    </>
  );
}
