import { ActionButton } from '@/components/ui/action-button';
import { DataTable } from '@/components/ui/data-table';
import type { FormActionFunction } from '@/components/ui/form-state';
import { Moment } from '@/components/ui/moment';
import type { SessionRow } from '@/lib/schemas/person';

type SessionTableProps = { sessions: readonly SessionRow[]; revoke: FormActionFunction<null> };

export function SessionTable({ sessions, revoke }: SessionTableProps) {
  return (
    <DataTable
      caption="Where you are signed in"
      captionHidden
      stacks
      rows={sessions}
      rowKey={(session) => session.id}
      columns={[
        { key: 'device', label: 'Browser', rowHeader: true, cell: (row) => row.device },
        { key: 'since', label: 'Since', cell: (row) => <Moment at={row.createdAt} /> },
        { key: 'until', label: 'Runs out', cell: (row) => <Moment at={row.expiresAt} /> },
        {
          key: 'end',
          label: 'End',
          labelHidden: true,
          className: 'md:text-right',
          cell: (row) =>
            row.current ? (
              <span className="text-ink-2">this browser</span>
            ) : (
              <ActionButton
                size="small"
                action={revoke}
                input={{ id: row.id }}
                pendingLabel="Ending …"
                aria-label={`End the session in ${row.device}`}
              >
                End the session
              </ActionButton>
            ),
        },
      ]}
    />
  );
}
