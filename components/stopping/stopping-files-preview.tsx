'use client';

import { memo, useMemo } from 'react';

import { ProblemList } from '@/components/upload/problem-list';

import { FileRow } from './file-row';
import { LayoutChoices } from './layout-choices';
import { lossWarnings } from './loss-warnings';
import { leaveOutTest } from './may-leave-out';
import type { StoppingPreview } from './preview-stopping';
import {
  withFileChoices,
  withLinesLeftOut,
  withoutFile,
  type StoppingChoices,
} from './stopping-choices';
import { StoppingFigure } from './stopping-figure';
import { WarningList } from './warning-list';

interface StoppingFilesPreviewProps {
  choices: StoppingChoices;
  /** null before the first reading; of earlier choices while `reading`. */
  preview: StoppingPreview | null;
  reading: boolean;
  onChange: (change: (before: StoppingChoices) => StoppingChoices) => void;
}

/**
 * What was recognised in the files, open to correction, and what would be stored. Remembered, so that
 * typing a name beside it does not draw all of it again.
 */
export const StoppingFilesPreview = memo(function StoppingFilesPreview({
  choices,
  preview,
  reading,
  onChange,
}: StoppingFilesPreviewProps) {
  const shown = preview !== null && preview.files.length > 0 ? preview : null;
  const mayLeaveOut = useMemo(
    () => leaveOutTest(shown?.files.map(({ table }) => table) ?? []),
    [shown],
  );
  return (
    <div aria-busy={reading} className="grid grid-cols-1 gap-6">
      <p role="status" className="-mb-4 text-sm text-ink-2">
        {reading ? 'Reading…' : countWords(choices.entries.length)}
      </p>
      <ul
        aria-label="Files of the set"
        className="relative max-h-[32rem] overflow-y-auto border-t border-rule"
      >
        {choices.entries.map((entry) => (
          <FileRow
            key={entry.file.name}
            entry={entry}
            preview={shown?.files.find((file) => file.entry.file === entry.file) ?? null}
            onChoose={(change) =>
              onChange((before) => withFileChoices(before, entry.file.name, change))
            }
            onRemove={() => onChange((before) => withoutFile(before, entry.file.name))}
          />
        ))}
      </ul>
      {shown && (
        <>
          <LayoutChoices
            layout={shown.layout}
            choices={choices}
            onChoose={(change) => onChange((before) => ({ ...before, ...change }))}
          />
          <ProblemList
            problems={shown.problems}
            mayLeaveOut={mayLeaveOut}
            onLeaveOut={(problems) => onChange((before) => withLinesLeftOut(before, problems))}
          />
        </>
      )}
      {shown?.set && (
        <>
          <WarningList warnings={[...shown.warnings, ...lossWarnings(shown.set.profiles)]} />
          <StoppingFigure profiles={shown.set.profiles} />
        </>
      )}
    </div>
  );
});

function countWords(files: number): string {
  return files === 1 ? '1 file' : `${files} files`;
}
