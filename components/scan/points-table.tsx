import { DataTable } from '@/components/ui/data-table';
import { asEntered, withDecimals } from '@/lib/format';
import type { Scan, TypedPoint } from '@/lib/schemas/scan';

interface PointsTableProps {
  points: readonly TypedPoint[];
  observable: Scan['observable'];
}

/** Measured numbers keep two digits of their σ, more than a result would; every digit is on hover. */
function dataDecimals(sigma: number): number {
  return Math.max(0, 1 - Math.floor(Math.log10(sigma)));
}

/** The stored points of a scan. */
export function PointsTable({ points, observable }: PointsTableProps) {
  const withNotes = points.some(({ note }) => note !== '');
  const digits = (value: number, sigma: number) => (
    <span title={String(value)}>{withDecimals(value, dataDecimals(sigma))}</span>
  );
  return (
    <DataTable
      dense
      captionHidden
      caption="Points of the scan"
      className="relative max-h-[28rem] overflow-y-auto"
      rows={points}
      rowKey={({ energyKeV }) => energyKeV}
      rowClassName={({ enabled }) => (enabled ? undefined : 'text-ink-3')}
      columns={[
        {
          key: 'energy',
          label: 'energy (keV)',
          numeric: true,
          rowHeader: true,
          cell: ({ energyKeV }) => asEntered(energyKeV),
        },
        {
          key: 'value',
          label: observable === 'rate' ? 'rate (µs⁻¹)' : 'fraction',
          numeric: true,
          cell: ({ value, sigma }) => digits(value, sigma),
        },
        { key: 'sigma', label: 'σ', numeric: true, cell: ({ sigma }) => digits(sigma, sigma) },
        { key: 'used', label: 'used', cell: ({ enabled }) => (enabled ? 'yes' : 'switched off') },
        ...(withNotes
          ? [{ key: 'note', label: 'note', cell: ({ note }: TypedPoint) => note }]
          : []),
      ]}
    />
  );
}
