import { ActionButton } from '@/components/ui/action-button';
import { DataTable } from '@/components/ui/data-table';
import type { FormActionFunction } from '@/components/ui/form-state';
import { Moment } from '@/components/ui/moment';
import type { Team } from '@/lib/schemas/team';

import { ROLE_WORDS } from './role-words';

type InvitationTableProps = {
  invitations: Team['invitations'];
  cancel: FormActionFunction<null>;
};

export function InvitationTable({ invitations, cancel }: InvitationTableProps) {
  return (
    <DataTable
      caption="Open invitations"
      stacks
      rows={invitations}
      rowKey={(invitation) => invitation.id}
      columns={[
        { key: 'email', label: 'E-mail', rowHeader: true, cell: (row) => row.email },
        { key: 'role', label: 'Role', cell: (row) => ROLE_WORDS[row.role].label },
        { key: 'until', label: 'Open until', cell: (row) => <Moment at={row.expiresAt} /> },
        {
          key: 'cancel',
          label: 'Withdraw',
          labelHidden: true,
          className: 'md:text-right',
          cell: (row) => (
            <ActionButton
              size="small"
              variant="quiet"
              action={cancel}
              input={{ id: row.id }}
              pendingLabel="Withdrawing …"
              aria-label={`Withdraw the invitation of ${row.email}`}
            >
              Withdraw
            </ActionButton>
          ),
        },
      ]}
    />
  );
}
