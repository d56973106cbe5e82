import { DataTable, type Column } from '@/components/ui/data-table';
import { Moment } from '@/components/ui/moment';
import { StateBadge } from '@/components/ui/state-badge';
import { TextLink } from '@/components/ui/text-link';
import { significant } from '@/lib/format';
import type { FitRow } from '@/lib/schemas/fit';

import { allInvented } from './all-invented';
import { Named } from './named';
import { ResultText } from './result-text';

type FitTableProps = {
  caption: string;
  fits: readonly FitRow[];
  /** Leaves the sample out where the page is about one sample. */
  withSample?: boolean;
};

export function FitTable({ caption, fits, withSample = true }: FitTableProps) {
  const name = nameColumn(!allInvented(fits));
  return (
    <DataTable
      caption={caption}
      captionHidden
      stacks
      columns={withSample ? [name, SAMPLE, ...REST] : [name, ...REST]}
      rows={fits}
      rowKey={(fit) => fit.id}
    />
  );
}

const nameColumn = (markRows: boolean): Column<FitRow> => ({
  key: 'name',
  label: 'Fit',
  rowHeader: true,
  cell: (fit) => (
    <Named marked={markRows && fit.invented}>
      <TextLink href={`/fits/${fit.id}`}>{fit.name}</TextLink>
    </Named>
  ),
});

const SAMPLE: Column<FitRow> = {
  key: 'sample',
  label: 'Sample, scan',
  cell: (fit) => (
    <>
      <TextLink href={`/samples/${fit.sampleId}`}>{fit.sampleName}</TextLink>
      <span className="text-ink-2">, {fit.scanName}</span>
    </>
  ),
};

const REST: readonly Column<FitRow>[] = [
  { key: 'profile', label: 'Profile', cell: (fit) => `${fit.profile} edge` },
  {
    key: 'edge',
    label: 'Edge depth',
    numeric: true,
    cell: (fit) => <ResultText of={fit.edge} quantity="depth" />,
  },
  {
    key: 'width',
    label: 'Edge width σ',
    numeric: true,
    cell: (fit) => <ResultText of={fit.width} quantity="width" />,
  },
  {
    key: 'chi',
    label: 'χ² / d.o.f.',
    numeric: true,
    cell: (fit) => `${significant(fit.chiSquare, 3)} / ${fit.degreesOfFreedom}`,
  },
  { key: 'state', label: 'State', cell: (fit) => <StateBadge state={fit.state} /> },
  {
    key: 'made',
    label: 'Made',
    cell: (fit) => (
      <span className="text-ink-2">
        {fit.createdBy}, <Moment at={fit.createdAt} dateOnly />
      </span>
    ),
  },
];
