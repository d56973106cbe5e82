import { DataTable, type Column } from '@/components/ui/data-table';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { TextLink } from '@/components/ui/text-link';
import type { IssuedProfileRow } from '@/lib/schemas/profile';

import { ResultText } from './result-text';

type IssuedTableProps = {
  caption: string;
  profiles: readonly IssuedProfileRow[];
  withSample?: boolean;
};

export function IssuedTable({ caption, profiles, withSample = true }: IssuedTableProps) {
  return (
    <DataTable
      caption={caption}
      captionHidden
      stacks
      columns={withSample ? [NUMBER, SAMPLE, ...REST] : [NUMBER, ...REST]}
      rows={profiles}
      rowKey={(profile) => profile.id}
    />
  );
}

const NUMBER: Column<IssuedProfileRow> = {
  key: 'number',
  label: 'Number',
  rowHeader: true,
  cell: (profile) => (
    <span className="inline-flex flex-wrap items-center gap-x-2 gap-y-1">
      <TextLink href={`/profiles/${profile.id}`} className="figures">
        {profile.number}
      </TextLink>
      {profile.invented && <InventedMark />}
    </span>
  ),
};

const SAMPLE: Column<IssuedProfileRow> = {
  key: 'sample',
  label: 'Sample',
  cell: (profile) => (
    <>
      <TextLink href={`/samples/${profile.sampleId}`}>{profile.sampleName}</TextLink>
      <span className="text-ink-2">, {profile.material}</span>
    </>
  ),
};

const REST: readonly Column<IssuedProfileRow>[] = [
  { key: 'scan', label: 'Energy scan', cell: (profile) => profile.scanName },
  {
    key: 'edge',
    label: 'Edge depth',
    numeric: true,
    cell: (profile) => <ResultText of={profile.edge} quantity="depth" />,
  },
  {
    key: 'issued',
    label: 'Issued',
    cell: (profile) => (
      <span className="text-ink-2">
        {profile.issuedBy}, <Moment at={profile.issuedAt} dateOnly />
      </span>
    ),
  },
];
