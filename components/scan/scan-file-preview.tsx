'use client';

import { Notice } from '@/components/ui/notice';
import { byteWords } from '@/components/upload/byte-words';
import { FormatChoices } from '@/components/upload/format-choices';
import { LeftOutLines } from '@/components/upload/left-out-lines';
import { ProblemList } from '@/components/upload/problem-list';
import { tableWords } from '@/components/upload/table-words';
import type { Scan } from '@/lib/schemas/scan';

import { AmplitudeChoices } from './amplitude-choices';
import { ColumnChoices } from './column-choices';
import { PointsPreview } from './points-preview';
import type { ScanFileModel } from './use-scan-file';

interface ScanFilePreviewProps {
  model: ScanFileModel;
  observable: Scan['observable'];
}

/** What was recognised in a scan file, open to correction, with every bad row by its line. */
export function ScanFilePreview({ model, observable }: ScanFilePreviewProps) {
  const { file, reading, table, refusal, preview, choices, choose } = model;
  if (file === null) return null;
  const leftOut = choices.skipLines;
  return (
    <div className="grid grid-cols-1 gap-5" aria-busy={reading}>
      <p className="text-sm">
        <strong className="font-semibold break-all">{file.name}</strong>{' '}
        <span className="text-ink-2">
          {byteWords(file.bytes.byteLength)}
          {table && ` · ${tableWords(table)}`}
        </span>
        <span role="status" className="text-ink-2">
          {reading && ' · Reading…'}
        </span>
      </p>
      {refusal.map((problem) => (
        <Notice key={problem.message} kind="problem" alert>
          {problem.message} Nothing was stored; choose another file or mend this one.
        </Notice>
      ))}
      {table && preview && (
        <>
          <FormatChoices
            delimiter={choices.delimiter ?? table.delimiter}
            decimal={choices.decimal ?? table.decimal}
            // Another delimiter makes other columns: what was matched before means nothing then.
            onDelimiter={(delimiter) => choose({ delimiter, columns: {} })}
            onDecimal={(decimal) => choose({ decimal, delimiter: table.delimiter })}
          />
          <ColumnChoices
            table={table}
            match={preview.match}
            energyUnit={preview.energyUnit}
            observable={observable}
            onColumn={(role, column) => choose({ columns: { ...choices.columns, [role]: column } })}
            onEnergyUnit={(energyUnit) => choose({ energyUnit })}
          />
          {observable === 'fraction' && (
            <AmplitudeChoices
              amplitudes={choices.amplitudes}
              onChange={(amplitudes) => choose({ amplitudes })}
            />
          )}
          {preview.reading && (
            <>
              <ProblemList
                problems={preview.reading.problems}
                // A fault without a column is about the whole file; leaving out a line would not mend it.
                mayLeaveOut={({ column }) => column !== null}
                onLeaveOut={(problems) =>
                  choose({
                    skipLines: [...new Set([...leftOut, ...problems.map(({ line }) => line ?? 0)])],
                  })
                }
              />
              <LeftOutLines
                fileName={file.name}
                lines={leftOut}
                onTakeBack={(line) =>
                  choose({ skipLines: leftOut.filter((other) => other !== line) })
                }
              />
              <PointsPreview points={preview.reading.points} observable={observable} />
            </>
          )}
        </>
      )}
    </div>
  );
}
