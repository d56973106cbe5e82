'use client';

import { useRouter } from 'next/navigation';
import { useMemo, useState } from 'react';

import { sheetContent } from '@/components/sheet/sheet-rows';
import { useSheet } from '@/components/sheet/use-sheet';
import { ButtonLink } from '@/components/ui/button-link';
import { fieldFaults, withoutPrefix } from '@/components/upload/field-faults';
import { SaveBar } from '@/components/upload/save-bar';
import { sendJson } from '@/components/upload/send-details';
import { useLeaveWarning } from '@/components/upload/use-leave-warning';
import { scanMetaSchema, type Scan } from '@/lib/schemas/scan';

import { PointsSheet } from './points-sheet';
import { draftOfScan } from './scan-draft';
import { ScanMetaFields } from './scan-meta-fields';
import { linesOfPoints, readTypedPoints, whyTypedBlocked } from './typed-points';

/** Conditions and points of a stored scan. Stored points are switched off, never removed. */
export function EditScanForm({ scan }: { scan: Scan }) {
  const router = useRouter();
  const [draft, setDraft] = useState(() => draftOfScan(scan));
  const [faults, setFaults] = useState<Record<string, string>>({});
  const [refusal, setRefusal] = useState<string | null>(null);
  const [saving, setSaving] = useState(false);
  const sheet = useSheet(() => sheetContent(linesOfPoints(scan.points), 4), 4);
  const typed = useMemo(() => readTypedPoints(sheet.content.rows, draft.observable), [sheet.content, draft.observable]);
  const changed = sheet.canUndo || JSON.stringify(draft) !== JSON.stringify(draftOfScan(scan));
  useLeaveWarning(changed && !saving);

  const save = async () => {
    const own = fieldFaults(scanMetaSchema, draft);
    setFaults(own);
    const [firstFault] = Object.values(own);
    if (firstFault !== undefined) return setRefusal(firstFault);
    setRefusal(null);
    setSaving(true);
    const points = sheet.canUndo ? typed.points : null;
    const sent = await sendJson(`/api/scans/${scan.id}`, 'PATCH', { id: scan.id, meta: draft, points });
    if (sent.ok) {
      router.push(`/scans/${scan.id}`);
      return router.refresh();
    }
    setSaving(false);
    setFaults(withoutPrefix(sent.fields, 'meta.'));
    setRefusal(sent.message);
  };

  return (
    <div className="grid gap-x-10 gap-y-8 py-6 lg:grid-cols-[minmax(0,1fr)_22rem]">
      <section aria-labelledby="points-heading" className="min-w-0">
        <h2 id="points-heading" className="mb-2">Points</h2>
        <p className="text-ink-2 mb-3 text-sm">
          Switch off what must not be used; the point stays visible. Fits keep the points that they were made with
          {scan.file && ', and the original file stays as it is'}.
        </p>
        <PointsSheet sheet={sheet} typed={typed} observable={draft.observable} />
      </section>
      <section aria-labelledby="about-heading" className="grid content-start gap-5">
        <h2 id="about-heading">About the scan</h2>
        <ScanMetaFields draft={draft} faults={faults} onChange={setDraft} />
        <SaveBar
          label="Save changes"
          blocked={whyTypedBlocked(typed) ?? (changed ? null : 'Nothing has changed yet.')}
          saving={saving}
          refusal={refusal}
          onSave={() => void save()}
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
