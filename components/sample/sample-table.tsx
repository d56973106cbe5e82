import { DataTable, type Column } from '@/components/ui/data-table';
import { InventedMark } from '@/components/ui/invented-mark';
import { TextLink } from '@/components/ui/text-link';
import type { SampleRow } from '@/lib/schemas/sample';

import { capText, dopingText, dopingType } from './carrier-words';

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
      columns={COLUMNS}
      rows={samples}
      rowKey={(sample) => sample.id}
    />
  );
}

const COLUMNS: readonly Column<SampleRow>[] = [
  {
    key: 'name',
    label: 'Sample',
    rowHeader: true,
    cell: (sample) => (
      <span className="inline-flex flex-wrap items-center gap-x-2 gap-y-1">
        <TextLink href={`/samples/${sample.id}`}>{sample.name}</TextLink>
        {sample.invented && <InventedMark />}
      </span>
    ),
  },
  {
    key: 'material',
    label: 'Material',
    cell: (sample) => `${dopingType(sample.carrier)} ${sample.material}`,
  },
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
