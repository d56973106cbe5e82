'use client';

import { useRouter } from 'next/navigation';
import { useMemo, useState } from 'react';

import { sheetContent } from '@/components/sheet/sheet-rows';
import { useSheet } from '@/components/sheet/use-sheet';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { Tabs } from '@/components/ui/tabs';
import { DropZone } from '@/components/upload/drop-zone';
import { SaveBar } from '@/components/upload/save-bar';
import { sendJson, sendUpload, type Sent } from '@/components/upload/send-details';
import { useFocusFirstFault } from '@/components/upload/use-focus-first-fault';
import { useLeaveWarning } from '@/components/upload/use-leave-warning';
import { useSaving } from '@/components/upload/use-saving';
import { scanMetaSchema } from '@/lib/schemas/scan';

import { PastePanel } from './paste-panel';
import { PointsSheet } from './points-sheet';
import { NEW_SCAN } from './scan-draft';
import { ScanFilePreview } from './scan-file-preview';
import { ScanMetaFields } from './scan-meta-fields';
import { readTypedPoints, whyTypedBlocked } from './typed-points';
import { useScanFile } from './use-scan-file';

interface AddScanFormProps {
  samples: readonly { id: string; name: string }[];
  sampleId: string | null;
}

const BLANK_ROWS = 8;

/** A scan from a file, from pasted text or typed in; nothing is sent before the preview is clean. */
export function AddScanForm({ samples, sampleId: firstSampleId }: AddScanFormProps) {
  const router = useRouter();
  const [sampleId, setSampleId] = useState(firstSampleId ?? '');
  const [way, setWay] = useState('file');
  const [draft, setDraft] = useState(NEW_SCAN);
  const [pasted, setPasted] = useState('');
  const { faults, refusal, saving, save } = useSaving(scanMetaSchema);
  const about = useFocusFirstFault<HTMLElement>(faults);
  const file = useScanFile(draft.observable, 'Choose a file first.');
  const paste = useScanFile(draft.observable, 'Paste a table first.');
  const sheet = useSheet(() => sheetContent([], 4, BLANK_ROWS), 4);
  const typed = useMemo(
    () => readTypedPoints(sheet.content.rows, draft.observable),
    [sheet.content, draft.observable],
  );

  const source = way === 'paste' ? paste : file;
  const pasteChanged = paste.file !== null && new TextDecoder().decode(paste.file.bytes) !== pasted;
  const blocked = whyBlocked();
  function whyBlocked(): string | null {
    if (sampleId === '') return 'Choose the sample first.';
    if (way === 'typed') return whyTypedBlocked(typed);
    return way === 'paste' && pasteChanged ? 'Read the changed text first.' : source.blocked;
  }
  useLeaveWarning(!saving && (file.file !== null || pasted !== '' || sheet.canUndo));

  const send = (): Promise<Sent> => {
    const about = { sampleId, meta: draft };
    if (way === 'typed')
      return sendJson('/api/scans', 'POST', {
        ...about,
        source: { kind: 'typed', points: typed.points },
      });
    const files = source.file === null ? [] : [source.file];
    return sendUpload('/api/scans', { ...about, reading: source.sent }, files);
  };
  const onSave = () => void save(draft, send, (id) => router.push(`/scans/${id}`));

  return (
    <div className="grid gap-x-10 gap-y-8 py-6 lg:grid-cols-[minmax(0,1fr)_22rem]">
      <section aria-labelledby="points-heading" className="min-w-0">
        <h2 id="points-heading" className="mb-2">
          Points
        </h2>
        <Tabs
          label="Where the points come from"
          value={way}
          onChange={setWay}
          tabs={[
            {
              value: 'file',
              label: 'File',
              panel: (
                <div className="grid grid-cols-1 gap-6">
                  <DropZone
                    multiple={false}
                    label={
                      file.file === null
                        ? 'Drop a scan file here, or choose one'
                        : 'Another file instead'
                    }
                    hint="Text with columns of energy, value and σ; comma, semicolon, tab or blanks between them. At most 5 MB."
                    onFiles={([taken]) => taken && file.take(taken)}
                  />
                  <ScanFilePreview model={file} observable={draft.observable} />
                </div>
              ),
            },
            {
              value: 'paste',
              label: 'Paste text',
              panel: (
                <PastePanel
                  text={pasted}
                  onText={setPasted}
                  changed={pasteChanged}
                  model={paste}
                  observable={draft.observable}
                />
              ),
            },
            {
              value: 'typed',
              label: 'Type',
              panel: <PointsSheet sheet={sheet} typed={typed} observable={draft.observable} />,
            },
          ]}
        />
      </section>
      <section ref={about} aria-labelledby="about-heading" className="grid content-start gap-5">
        <h2 id="about-heading">About the scan</h2>
        <Field label="Sample" error={faults.sampleId} required>
          <Select value={sampleId} onChange={(event) => setSampleId(event.target.value)}>
            <option value="">choose…</option>
            {samples.map(({ id, name }) => (
              <option key={id} value={id}>
                {name}
              </option>
            ))}
          </Select>
        </Field>
        <ScanMetaFields draft={draft} faults={faults} onChange={setDraft} />
        <SaveBar
          label="Save scan"
          blocked={blocked}
          saving={saving}
          refusal={refusal}
          onSave={onSave}
        />
      </section>
    </div>
  );
}
