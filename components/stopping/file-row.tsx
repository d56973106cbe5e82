'use client';

import { Button } from '@/components/ui/button';
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
    <li className="grid gap-1 border-b border-rule py-2.5 text-sm">
      <div className="flex flex-wrap items-start justify-between gap-x-4 gap-y-2">
        <p className="min-w-0 flex-1 basis-64">
          <strong className="font-semibold break-all">{file.name}</strong>{' '}
          <span className="text-ink-2">
            {byteWords(file.bytes.byteLength)}
            {foundWords(preview)}
          </span>
        </p>
        {energiesKeV.length === 1 && (
          <EnergyField
            name={file.name}
            typed={entry.energy}
            foundKeV={energiesKeV[0] ?? null}
            onType={(energy) => onChoose({ energy })}
          />
        )}
        <Button size="small" variant="quiet" aria-label={`Remove ${file.name}`} onClick={onRemove}>
          Remove
        </Button>
      </div>
      {table && (
        <details>
          <summary className="w-fit py-0.5 text-[0.8125rem] text-ink-2">
            Change how it is read
          </summary>
          <div className="mt-1 max-w-md pb-1">
            <FormatChoices
              delimiter={entry.delimiter ?? table.delimiter}
              decimal={entry.decimal ?? table.decimal}
              onDelimiter={(delimiter) => onChoose({ delimiter })}
              onDecimal={(decimal) => onChoose({ decimal, delimiter: table.delimiter })}
            />
          </div>
        </details>
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
  return table === null
    ? ' · not readable as a table'
    : ` · ${tableWords(table)} · ${energyWords(energiesKeV)}`;
}

function energyWords(energiesKeV: readonly (number | null)[]): string {
  const known = energiesKeV.filter((energy) => energy !== null);
  if (known.length === 0) return 'no energy found';
  if (known.length === 1) return `${known[0]} keV`;
  return `${known.length} energies, ${Math.min(...known)} to ${Math.max(...known)} keV`;
}

interface EnergyFieldProps {
  name: string;
  typed: string;
  foundKeV: number | null;
  onType: (energy: string) => void;
}

/** The energy of a one-energy file: what was read from its name or heading, unless another is typed. */
function EnergyField({ name, typed, foundKeV, onType }: EnergyFieldProps) {
  return (
    <label className="flex items-center gap-2">
      <span className="text-ink-2">
        Energy<span className="sr-only"> of {name}</span> (keV)
      </span>
      <span className="w-24">
        <TextInput
          numeric
          className="px-2 py-1"
          value={typed}
          placeholder={foundKeV === null ? 'type it' : String(foundKeV)}
          onChange={(event) => onType(event.target.value)}
        />
      </span>
    </label>
  );
}
