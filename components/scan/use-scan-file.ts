'use client';

import { useCallback, useMemo, useState } from 'react';

import type { ChosenFile } from '@/components/upload/chosen-file';
import { useDeferredReading } from '@/components/upload/use-deferred-reading';
import type { FileProblem } from '@/lib/files/problem';
import { readTable, type ReadTableResult } from '@/lib/files/read-table';
import { guessScanColumns, type ScanColumns } from '@/lib/files/scan-columns';
import type { Table } from '@/lib/files/table';
import type { Scan, ScanReading } from '@/lib/schemas/scan';

import { NO_CHOICES, previewScan, type ScanChoices, type ScanPreview } from './scan-choices';

export interface ScanFileModel {
  file: ChosenFile | null;
  reading: boolean;
  table: Table | null;
  /** Why the file is no table at all. */
  refusal: readonly FileProblem[];
  preview: ScanPreview | null;
  choices: ScanChoices;
  /** Why the file cannot be stored yet; null when it can. */
  blocked: string | null;
  sent: ScanReading | null;
  take: (file: ChosenFile | null) => void;
  choose: (change: Partial<ScanChoices>) => void;
}

interface FileReading {
  read: ReadTableResult;
  /** What was recognised of the columns. */
  guess: ScanColumns | null;
}

/** A scan file in preview: the text is taken apart once per format, the columns at every choice. */
export function useScanFile(observable: Scan['observable'], nothingYet: string): ScanFileModel {
  const [file, setFile] = useState<ChosenFile | null>(null);
  const [choices, setChoices] = useState(NO_CHOICES);
  const { delimiter, decimal } = choices;
  const readFile = useCallback((): FileReading | null => {
    if (file === null) return null;
    const read = readTable(file.name, file.bytes, {
      delimiter: delimiter ?? undefined,
      decimal: decimal ?? undefined,
    });
    return { read, guess: read.ok ? guessScanColumns(read.table) : null };
  }, [file, delimiter, decimal]);
  const { result, reading } = useDeferredReading(readFile);
  const table = result?.read.ok ? result.read.table : null;
  const guess = result?.guess ?? null;
  const preview = useMemo(
    () => (table === null ? null : previewScan(table, guess, choices, observable)),
    [table, guess, choices, observable],
  );
  const refusal = file !== null && result?.read.ok === false ? result.read.problems : [];
  const current = file !== null && !reading;
  return {
    file,
    reading: file !== null && reading,
    table: file === null ? null : table,
    refusal,
    preview: file === null ? null : preview,
    choices,
    blocked: blockedBy(file, reading, refusal, preview, nothingYet),
    sent: current ? (preview?.sent ?? null) : null,
    take: (taken) => {
      setFile(taken);
      setChoices(NO_CHOICES);
    },
    choose: (change) => setChoices((before) => ({ ...before, ...change })),
  };
}

function blockedBy(
  file: ChosenFile | null,
  reading: boolean,
  refusal: readonly FileProblem[],
  preview: ScanPreview | null,
  nothingYet: string,
): string | null {
  if (file === null) return nothingYet;
  if (reading) return 'Reading…';
  if (refusal.length > 0) return 'The file cannot be read as a table.';
  return preview === null ? 'Reading…' : preview.blocked;
}
