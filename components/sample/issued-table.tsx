import { DataTable, type Column } from '@/components/ui/data-table';
import { Moment } from '@/components/ui/moment';
import { TextLink } from '@/components/ui/text-link';
import type { IssuedProfileRow } from '@/lib/schemas/profile';

import { allInvented } from './all-invented';
import { Named } from './named';
import { ResultText } from './result-text';

type IssuedTableProps = {
  caption: string;
  profiles: readonly IssuedProfileRow[];
  withSample?: boolean;
};

export function IssuedTable({ caption, profiles, withSample = true }: IssuedTableProps) {
  const number = numberColumn(!allInvented(profiles));
  return (
    <DataTable
      caption={caption}
      captionHidden
      stacks
      columns={withSample ? [number, SAMPLE, ...REST] : [number, ...REST]}
      rows={profiles}
      rowKey={(profile) => profile.id}
    />
  );
}

const numberColumn = (markRows: boolean): Column<IssuedProfileRow> => ({
  key: 'number',
  label: 'Number',
  rowHeader: true,
  cell: (profile) => (
    <Named marked={markRows && profile.invented}>
      <TextLink href={`/profiles/${profile.id}`} className="figures">
        {profile.number}
      </TextLink>
    </Named>
  ),
});

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
