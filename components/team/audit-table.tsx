import { DataTable } from '@/components/ui/data-table';
import { Moment } from '@/components/ui/moment';
import type { AuditEntry } from '@/lib/schemas/team';

import { auditWords } from './audit-words';

export function AuditTable({ entries }: { entries: readonly AuditEntry[] }) {
  return (
    <DataTable
      caption="Audit trail, newest first"
      captionHidden
      stacks
      dense
      rows={entries}
      rowKey={(entry) => entry.id}
      columns={[
        {
          key: 'at',
          label: 'When',
          className: 'whitespace-nowrap text-ink-2',
          cell: (entry) => <Moment at={entry.at} />,
        },
        { key: 'person', label: 'Who', rowHeader: true, cell: (entry) => entry.person },
        { key: 'verb', label: 'Did what', cell: (entry) => auditWords(entry.verb) },
        { key: 'subject', label: 'To what', cell: (entry) => entry.subject },
      ]}
    />
  );
}
