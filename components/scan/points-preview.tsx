'use client';

import { DataTable } from '@/components/ui/data-table';
import type { ScanRow } from '@/lib/files/scan-file';
import { significant } from '@/lib/format';
import type { Scan } from '@/lib/schemas/scan';

import { ScanFigure } from './scan-figure';

interface PointsPreviewProps {
  points: readonly ScanRow[];
  observable: Scan['observable'];
}

/** The points as they would be stored, drawn and listed with their lines. */
export function PointsPreview({ points, observable }: PointsPreviewProps) {
  if (points.length === 0) return null;
  const withNotes = points.some(({ note }) => note !== null);
  return (
    <div className="grid grid-cols-1 gap-4">
      <ScanFigure points={points} observable={observable} title="Preview" />
      <details className="text-sm">
        <summary className="py-1 text-ink-2">
          The {points.length} {points.length === 1 ? 'point' : 'points'} as read, by line
        </summary>
        <DataTable
          dense
          captionHidden
          caption="Points as read"
          className="relative max-h-96 overflow-y-auto"
          rows={points}
          rowKey={({ line }) => line}
          columns={[
            { key: 'line', label: 'line', numeric: true, cell: ({ line }) => line },
            {
              key: 'energy',
              label: 'energy (keV)',
              numeric: true,
              cell: ({ energyKeV }) => significant(energyKeV, 6),
            },
            {
              key: 'value',
              label: observable === 'rate' ? 'rate (µs⁻¹)' : 'fraction',
              numeric: true,
              cell: ({ value }) => significant(value, 6),
            },
            { key: 'sigma', label: 'σ', numeric: true, cell: ({ sigma }) => significant(sigma, 4) },
            ...(withNotes
              ? [{ key: 'note', label: 'note', cell: ({ note }: ScanRow) => note ?? '' }]
              : []),
          ]}
        />
      </details>
    </div>
  );
}
