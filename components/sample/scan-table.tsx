import { ButtonLink } from '@/components/ui/button-link';
import { DataTable, type Column } from '@/components/ui/data-table';
import { TextLink } from '@/components/ui/text-link';
import { asEntered } from '@/lib/format';
import type { Scan } from '@/lib/schemas/scan';

import { allInvented } from './all-invented';
import { Named } from './named';

type ScanTableProps = { caption: string; scans: readonly Scan[]; mayFit: boolean };

export function ScanTable({ caption, scans, mayFit }: ScanTableProps) {
  const columns = [nameColumn(!allInvented(scans)), ...COLUMNS];
  return (
    <DataTable
      caption={caption}
      captionHidden
      stacks
      columns={mayFit ? [...columns, FIT] : columns}
      rows={scans}
      rowKey={(scan) => scan.id}
    />
  );
}

const OBSERVABLE_WORDS = { fraction: 'diamagnetic fraction', rate: 'capture rate (µs⁻¹)' } as const;

const nameColumn = (markRows: boolean): Column<Scan> => ({
  key: 'name',
  label: 'Energy scan',
  rowHeader: true,
  cell: (scan) => (
    <Named marked={markRows && scan.invented}>
      <TextLink href={`/scans/${scan.id}`}>{scan.name}</TextLink>
    </Named>
  ),
});

const COLUMNS: readonly Column<Scan>[] = [
  { key: 'observable', label: 'Observable', cell: (scan) => OBSERVABLE_WORDS[scan.observable] },
  { key: 'energies', label: 'Energies', numeric: true, cell: energiesText },
  {
    key: 'temperature',
    label: 'Temperature',
    numeric: true,
    cell: (scan) => quantity(scan.temperatureK, 'K'),
  },
  { key: 'field', label: 'Field', numeric: true, cell: (scan) => quantity(scan.fieldMT, 'mT') },
  { key: 'light', label: 'Light', cell: (scan) => scan.illumination },
  { key: 'measured', label: 'Measured', cell: (scan) => scan.measuredOn || '–' },
];

const FIT: Column<Scan> = {
  key: 'fit',
  label: 'Fit',
  labelHidden: true,
  className: 'md:text-right',
  cell: (scan) => (
    <ButtonLink size="small" href={`/fits/new?scan=${scan.id}`} aria-label={`Fit ${scan.name}`}>
      Fit
    </ButtonLink>
  ),
};

function energiesText(scan: Scan): string {
  const energies = scan.points.map((point) => point.energyKeV);
  if (energies.length === 0) return '–';
  const range = `${asEntered(Math.min(...energies))} to ${asEntered(Math.max(...energies))} keV`;
  return `${energies.length}, ${range}`;
}

function quantity(value: number | null, unit: string): string {
  return value === null ? '–' : `${asEntered(value)} ${unit}`;
}
