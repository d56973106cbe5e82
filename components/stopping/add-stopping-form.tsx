'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';

import { DropZone } from '@/components/upload/drop-zone';
import { fieldFaults, withoutPrefix } from '@/components/upload/field-faults';
import { ProblemList } from '@/components/upload/problem-list';
import { SaveBar } from '@/components/upload/save-bar';
import { sendUpload } from '@/components/upload/send-details';
import { useLeaveWarning } from '@/components/upload/use-leave-warning';
import type { FileProblem } from '@/lib/files/problem';
import { stoppingMetaSchema } from '@/lib/schemas/stopping-set';

import { FileRow } from './file-row';
import { LayoutChoices } from './layout-choices';
import { lossWarnings } from './loss-warnings';
import { leaveOutTest } from './may-leave-out';
import { NO_STOPPING_CHOICES, withFileChoices, withFiles, withLinesLeftOut, withoutFile } from './stopping-choices';
import { NEW_STOPPING } from './stopping-draft';
import { StoppingFigure } from './stopping-figure';
import { StoppingMetaFields } from './stopping-meta-fields';
import { useStoppingPreview } from './use-stopping-preview';
import { WarningList } from './warning-list';

/** A stopping set from one matrix file or many files; nothing is sent before all of them read cleanly. */
export function AddStoppingForm() {
  const router = useRouter();
  const [choices, setChoices] = useState(NO_STOPPING_CHOICES);
  const [draft, setDraft] = useState(NEW_STOPPING);
  const [faults, setFaults] = useState<Record<string, string>>({});
  const [refusal, setRefusal] = useState<string | null>(null);
  const [saving, setSaving] = useState(false);
  const { preview, reading } = useStoppingPreview(choices);
  const { entries } = choices;
  const blocked = reading || preview === null ? 'Reading…' : preview.blocked;
  useLeaveWarning(!saving && entries.length > 0);

  const save = async () => {
    const own = fieldFaults(stoppingMetaSchema, draft);
    setFaults(own);
    const [firstFault] = Object.values(own);
    if (firstFault !== undefined) return setRefusal(firstFault);
    if (!preview?.sent) return;
    setRefusal(null);
    setSaving(true);
    const details = { meta: draft, reading: preview.sent };
    const sent = await sendUpload('/api/stopping-sets', details, entries.map(({ file }) => file));
    if (sent.ok) return router.push(`/stopping/${sent.id}`);
    setSaving(false);
    setFaults(withoutPrefix(sent.fields, 'meta.'));
    setRefusal(sent.message);
  };
  const leaveOut = (problems: readonly FileProblem[]) => setChoices((before) => withLinesLeftOut(before, problems));

  return (
    <div className="grid gap-x-10 gap-y-8 py-6 lg:grid-cols-[minmax(0,1fr)_22rem]">
      <section aria-labelledby="files-heading" className="grid min-w-0 content-start gap-6">
        <h2 id="files-heading">Files</h2>
        <DropZone
          multiple
          label={entries.length === 0 ? 'Drop stopping profiles here, or choose them' : 'Add or replace files'}
          hint="One matrix (a depth column and a column per energy, the energy in its heading), or one file per energy named like 12.5keV.txt. At most 5 MB a file."
          onFiles={(files) => setChoices((before) => withFiles(before, files))}
        />
        {entries.length > 0 && (
          <div aria-busy={reading} className="grid gap-6">
            <p role="status" className="text-ink-2 text-sm empty:hidden">
              {reading ? 'Reading…' : ''}
            </p>
            <ul aria-label="Files of the set" className="border-rule max-h-[32rem] overflow-y-auto border-t">
              {entries.map((entry) => (
                <FileRow
                  key={entry.file.name}
                  entry={entry}
                  preview={preview?.files.find((file) => file.entry.file === entry.file) ?? null}
                  onChoose={(change) => setChoices((before) => withFileChoices(before, entry.file.name, change))}
                  onRemove={() => setChoices((before) => withoutFile(before, entry.file.name))}
                />
              ))}
            </ul>
            {preview && preview.files.length > 0 && (
              <>
                <LayoutChoices
                  layout={preview.layout}
                  choices={choices}
                  onChoose={(change) => setChoices((before) => ({ ...before, ...change }))}
                />
                <ProblemList
                  problems={preview.problems}
                  mayLeaveOut={leaveOutTest(preview.files.map(({ table }) => table))}
                  onLeaveOut={leaveOut}
                />
                {preview.set && (
                  <>
                    <WarningList warnings={[...preview.warnings, ...lossWarnings(preview.set.profiles)]} />
                    <StoppingFigure profiles={preview.set.profiles} />
                  </>
                )}
              </>
            )}
          </div>
        )}
      </section>
      <section aria-labelledby="about-heading" className="grid content-start gap-5">
        <h2 id="about-heading">About the set</h2>
        <StoppingMetaFields draft={draft} faults={faults} onChange={setDraft} />
        <SaveBar label="Save stopping set" blocked={blocked} saving={saving} refusal={refusal} onSave={() => void save()} />
      </section>
    </div>
  );
}
