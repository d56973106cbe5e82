import { DataTable, type Column } from '@/components/ui/data-table';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { StateBadge } from '@/components/ui/state-badge';
import { TextLink } from '@/components/ui/text-link';
import { significant } from '@/lib/format';
import type { FitRow } from '@/lib/schemas/fit';

import { ResultText } from './result-text';

type FitTableProps = {
  caption: string;
  fits: readonly FitRow[];
  /** Leaves the sample out where the page is about one sample. */
  withSample?: boolean;
};

export function FitTable({ caption, fits, withSample = true }: FitTableProps) {
  return (
    <DataTable
      caption={caption}
      captionHidden
      stacks
      columns={withSample ? [NAME, SAMPLE, ...REST] : [NAME, ...REST]}
      rows={fits}
      rowKey={(fit) => fit.id}
    />
  );
}

const NAME: Column<FitRow> = {
  key: 'name',
  label: 'Fit',
  rowHeader: true,
  cell: (fit) => (
    <span className="inline-flex flex-wrap items-center gap-x-2 gap-y-1">
      <TextLink href={`/fits/${fit.id}`}>{fit.name}</TextLink>
      {fit.invented && <InventedMark />}
    </span>
  ),
};

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
