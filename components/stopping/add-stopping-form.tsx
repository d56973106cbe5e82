'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';

import { DropZone } from '@/components/upload/drop-zone';
import { SaveBar } from '@/components/upload/save-bar';
import { sendUpload } from '@/components/upload/send-details';
import { useFocusFirstFault } from '@/components/upload/use-focus-first-fault';
import { useLeaveWarning } from '@/components/upload/use-leave-warning';
import { useSaving } from '@/components/upload/use-saving';
import { stoppingMetaSchema } from '@/lib/schemas/stopping-set';

import { NO_STOPPING_CHOICES, withFiles } from './stopping-choices';
import { NEW_STOPPING } from './stopping-draft';
import { StoppingFilesPreview } from './stopping-files-preview';
import { StoppingMetaFields } from './stopping-meta-fields';
import { useStoppingPreview } from './use-stopping-preview';

/** A stopping set from one matrix file or many files; nothing is sent before all of them read cleanly. */
export function AddStoppingForm() {
  const router = useRouter();
  const [choices, setChoices] = useState(NO_STOPPING_CHOICES);
  const [draft, setDraft] = useState(NEW_STOPPING);
  const { faults, refusal, saving, save } = useSaving(stoppingMetaSchema);
  const about = useFocusFirstFault<HTMLElement>(faults);
  const { preview, reading } = useStoppingPreview(choices);
  const { entries } = choices;
  const blocked = reading || preview === null ? 'Reading…' : preview.blocked;
  useLeaveWarning(!saving && entries.length > 0);

  const send = () => {
    const details = { meta: draft, reading: preview?.sent };
    return sendUpload(
      '/api/stopping-sets',
      details,
      entries.map(({ file }) => file),
    );
  };
  const onSave = () => void save(draft, send, (id) => router.push(`/stopping/${id}`));

  return (
    <div className="grid gap-x-10 gap-y-8 py-6 lg:grid-cols-[minmax(0,1fr)_22rem]">
      <section aria-labelledby="files-heading" className="grid min-w-0 content-start gap-6">
        <h2 id="files-heading">Files</h2>
        <DropZone
          multiple
          label={
            entries.length === 0
              ? 'Drop stopping profiles here, or choose them'
              : 'Add or replace files'
          }
          hint="One matrix (a depth column and a column per energy, the energy in its heading), or one file per energy named like 12.5keV.txt. At most 5 MB a file."
          onFiles={(files) => setChoices((before) => withFiles(before, files))}
        />
        {entries.length > 0 && (
          <StoppingFilesPreview
            choices={choices}
            preview={preview}
            reading={reading}
            onChange={setChoices}
          />
        )}
      </section>
      <section ref={about} aria-labelledby="about-heading" className="grid content-start gap-5">
        <h2 id="about-heading">About the set</h2>
        <StoppingMetaFields draft={draft} faults={faults} onChange={setDraft} />
        <SaveBar
          label="Save stopping set"
          blocked={blocked}
          saving={saving}
          refusal={refusal}
          onSave={onSave}
        />
      </section>
    </div>
  );
}
