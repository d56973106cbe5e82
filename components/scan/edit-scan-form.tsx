'use client';

import { useRouter } from 'next/navigation';
import { useMemo, useState } from 'react';

import { sheetContent } from '@/components/sheet/sheet-rows';
import { useSheet } from '@/components/sheet/use-sheet';
import { ButtonLink } from '@/components/ui/button-link';
import { SaveBar } from '@/components/upload/save-bar';
import { sendJson } from '@/components/upload/send-details';
import { useFocusFirstFault } from '@/components/upload/use-focus-first-fault';
import { useLeaveWarning } from '@/components/upload/use-leave-warning';
import { useSaving } from '@/components/upload/use-saving';
import { scanMetaSchema, type Scan } from '@/lib/schemas/scan';

import { PointsSheet } from './points-sheet';
import { draftOfScan } from './scan-draft';
import { ScanMetaFields } from './scan-meta-fields';
import { linesOfPoints, readTypedPoints, whyTypedBlocked } from './typed-points';

/** Conditions and points of a stored scan. Stored points are switched off, never removed. */
export function EditScanForm({ scan }: { scan: Scan }) {
  const router = useRouter();
  const [draft, setDraft] = useState(() => draftOfScan(scan));
  const { faults, refusal, saving, save } = useSaving(scanMetaSchema);
  const about = useFocusFirstFault<HTMLElement>(faults);
  const sheet = useSheet(() => sheetContent(linesOfPoints(scan.points), 4), 4);
  const typed = useMemo(
    () => readTypedPoints(sheet.content.rows, draft.observable),
    [sheet.content, draft.observable],
  );
  const changed = sheet.canUndo || JSON.stringify(draft) !== JSON.stringify(draftOfScan(scan));
  useLeaveWarning(changed && !saving);

  const send = () => {
    const points = sheet.canUndo ? typed.points : null;
    return sendJson(`/api/scans/${scan.id}`, 'PATCH', { id: scan.id, meta: draft, points });
  };
  const showScan = (id: string) => {
    router.push(`/scans/${id}`);
    router.refresh();
  };

  return (
    <div className="grid gap-x-10 gap-y-8 py-6 lg:grid-cols-[minmax(0,1fr)_22rem]">
      <section aria-labelledby="points-heading" className="min-w-0">
        <h2 id="points-heading" className="mb-2">
          Points
        </h2>
        <p className="mb-3 text-sm text-ink-2">
          Switch off what must not be used; the point stays visible. Fits keep the points that they
          were made with
          {scan.file && ', and the original file stays as it is'}.
        </p>
        <PointsSheet sheet={sheet} typed={typed} observable={draft.observable} />
      </section>
      <section ref={about} aria-labelledby="about-heading" className="grid content-start gap-5">
        <h2 id="about-heading">About the scan</h2>
        <ScanMetaFields draft={draft} faults={faults} onChange={setDraft} />
        <SaveBar
          label="Save changes"
          blocked={whyTypedBlocked(typed) ?? (changed ? null : 'Nothing has changed yet.')}
          saving={saving}
          refusal={refusal}
          onSave={() => void save(draft, send, showScan)}
        />
        <div>
          <ButtonLink variant="quiet" size="small" href={`/scans/${scan.id}`}>
            Leave without saving
          </ButtonLink>
        </div>
      </section>
    </div>
  );
}
