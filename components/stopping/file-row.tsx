'use client';

import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { TextInput } from '@/components/ui/text-input';
import { byteWords } from '@/components/upload/byte-words';
import { FormatChoices } from '@/components/upload/format-choices';
import { LeftOutLines } from '@/components/upload/left-out-lines';
import { tableWords } from '@/components/upload/table-words';

import type { FilePreview } from './preview-stopping';
import type { FileChoices, StoppingEntry } from './stopping-choices';

interface FileRowProps {
  entry: StoppingEntry;
  /** What was recognised; null while the file is read. */
  preview: FilePreview | null;
  onChoose: (change: Partial<FileChoices>) => void;
  onRemove: () => void;
}

/** One file of a stopping set: what was recognised in it, and how to correct that. */
export function FileRow({ entry, preview, onChoose, onRemove }: FileRowProps) {
  const { file, skipLines } = entry;
  const table = preview?.table ?? null;
  const energiesKeV = preview?.energiesKeV ?? [];
  return (
    <li className="border-rule grid gap-2 border-b py-3 text-sm">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
        <p className="min-w-0">
          <strong className="font-semibold break-all">{file.name}</strong>{' '}
          <span className="text-ink-2">
            {byteWords(file.bytes.byteLength)}
            {foundWords(preview)}
          </span>
        </p>
        <Button size="small" variant="quiet" aria-label={`Remove ${file.name}`} onClick={onRemove}>
          Remove
        </Button>
      </div>
      {table && (
        <details>
          <summary className="text-ink-2 py-1">Change how it is read</summary>
          <div className="mt-1 grid gap-3 sm:grid-cols-[2fr_1fr]">
            <FormatChoices
              delimiter={entry.delimiter ?? table.delimiter}
              decimal={entry.decimal ?? table.decimal}
              onDelimiter={(delimiter) => onChoose({ delimiter })} onDecimal={(decimal) => onChoose({ decimal, delimiter: table.delimiter })} />
          </div>
        </details>
      )}
      {energiesKeV.length === 1 && (
        <Field label="Energy" unit="keV" className="max-w-56" hint={energyHint(entry.energy, energiesKeV[0] ?? null)}>
          <TextInput
            numeric
            value={entry.energy}
            placeholder={energiesKeV[0] === null ? '' : String(energiesKeV[0])}
            onChange={(event) => onChoose({ energy: event.target.value })}
          />
        </Field>
      )}
      <LeftOutLines
        fileName={file.name}
        lines={skipLines}
        onTakeBack={(line) => onChoose({ skipLines: skipLines.filter((other) => other !== line) })}
      />
    </li>
  );
}

function foundWords(preview: FilePreview | null): string {
  if (preview === null) return ' · Reading…';
  const { table, energiesKeV } = preview;
  return table === null ? ' · not readable as a table' : ` · ${tableWords(table)} · ${energyWords(energiesKeV)}`;
}

function energyWords(energiesKeV: readonly (number | null)[]): string {
  const known = energiesKeV.filter((energy) => energy !== null);
  if (known.length === 0) return 'no energy found';
  if (known.length === 1) return `${known[0]} keV`;
  return `${known.length} energies, ${Math.min(...known)} to ${Math.max(...known)} keV`;
}

function energyHint(typed: string, energyKeV: number | null): string {
  if (typed !== '') return 'Typed here; empty it to read it from the file.';
  return energyKeV === null ? 'Neither name nor heading names one; type it.' : 'Read from the name or the heading.';
}
