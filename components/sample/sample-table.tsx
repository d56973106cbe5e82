import { DataTable, type Column } from '@/components/ui/data-table';
import { TextLink } from '@/components/ui/text-link';
import type { SampleRow } from '@/lib/schemas/sample';

import { allInvented } from './all-invented';
import { capText, dopingText } from './carrier-words';
import { Named } from './named';

export function SampleTable({
  caption,
  samples,
}: {
  caption: string;
  samples: readonly SampleRow[];
}) {
  return (
    <DataTable
      caption={caption}
      captionHidden
      stacks
      columns={[nameColumn(!allInvented(samples)), ...COLUMNS]}
      rows={samples}
      rowKey={(sample) => sample.id}
    />
  );
}

const nameColumn = (markRows: boolean): Column<SampleRow> => ({
  key: 'name',
  label: 'Sample',
  rowHeader: true,
  cell: (sample) => (
    <Named marked={markRows && sample.invented}>
      <TextLink href={`/samples/${sample.id}`}>{sample.name}</TextLink>
    </Named>
  ),
});

const COLUMNS: readonly Column<SampleRow>[] = [
  { key: 'material', label: 'Material', cell: (sample) => sample.material },
  { key: 'carrier', label: 'Carriers', cell: (sample) => sample.carrier },
  {
    key: 'doping',
    label: 'Doping',
    numeric: true,
    cell: (sample) => dopingText(sample) ?? '–',
  },
  { key: 'cap', label: 'Cap layer', cell: (sample) => capText(sample) ?? '–' },
  { key: 'treatment', label: 'Treatment', cell: (sample) => sample.treatment || '–' },
  { key: 'scans', label: 'Scans', numeric: true, cell: (sample) => sample.scans },
  { key: 'fits', label: 'Fits', numeric: true, cell: (sample) => sample.fits },
  { key: 'issued', label: 'Issued', numeric: true, cell: (sample) => sample.issuedProfiles },
];
