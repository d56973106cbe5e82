import { DataTable } from '@/components/ui/data-table';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { TextLink } from '@/components/ui/text-link';
import { ParameterFigure } from '@/components/review/parameter-figure';
import type { IssuedProfileRow } from '@/lib/schemas/profile';

/** Issued profiles with the one number that each of them answers. */
export function ProfileList({ profiles }: { profiles: readonly IssuedProfileRow[] }) {
  return (
    <DataTable
      caption="Issued profiles"
      captionHidden
      stacks
      rows={profiles}
      rowKey={(row) => row.id}
      columns={[
        {
          key: 'number',
          label: 'number',
          rowHeader: true,
          cell: (row) => (
            <span className="flex flex-wrap items-center gap-2">
              <TextLink href={`/profiles/${row.id}`} className="figures">
                {row.number}
              </TextLink>
              {row.invented && <InventedMark />}
            </span>
          ),
        },
        {
          key: 'sample',
          label: 'sample, scan',
          cell: (row) => (
            <>
              <TextLink href={`/samples/${row.sampleId}`}>{row.sampleName}</TextLink>,{' '}
              {row.scanName}
            </>
          ),
        },
        { key: 'material', label: 'material', cell: (row) => row.material },
        { key: 'profile', label: 'profile', cell: (row) => `${row.profile} edge` },
        {
          key: 'edge',
          label: 'edge',
          cell: (row) => <ParameterFigure parameter={row.edge} unit="nm" />,
        },
        {
          key: 'width',
          label: 'width σ',
          cell: (row) => <ParameterFigure parameter={row.width} unit="nm" />,
        },
        {
          key: 'by',
          label: 'fitted, accepted by',
          cell: (row) => `${row.fittedBy}, ${row.issuedBy}`,
        },
        { key: 'at', label: 'issued', cell: (row) => <Moment at={row.issuedAt} dateOnly /> },
      ]}
    />
  );
}
