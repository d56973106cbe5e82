import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Button } from '@/components/ui/button';
import { DataTable, type Column } from '@/components/ui/data-table';
import type { FormActionFunction } from '@/components/ui/form-state';
import { Moment } from '@/components/ui/moment';
import type { Team } from '@/lib/schemas/team';

import { RoleSelect } from './role-select';
import { ROLE_WORDS } from './role-words';

type Person = Team['people'][number];

type PeopleTableProps = {
  people: readonly Person[];
  /** Who looks at the page. */
  viewerId: string;
  teamName: string;
  /** Null for people who may not change anything. */
  changes: { changeRole: FormActionFunction<null>; removePerson: FormActionFunction<null> } | null;
};

export function PeopleTable({ people, viewerId, teamName, changes }: PeopleTableProps) {
  const columns: Column<Person>[] = [
    {
      key: 'name',
      label: 'Name',
      rowHeader: true,
      cell: (person) => (person.userId === viewerId ? `${person.name} (you)` : person.name),
    },
    { key: 'email', label: 'E-mail', cell: (person) => person.email },
    {
      key: 'role',
      label: 'Role',
      cell: (person) =>
        changes === null ? (
          ROLE_WORDS[person.role].label
        ) : (
          <RoleSelect
            action={changes.changeRole}
            userId={person.userId}
            name={person.name}
            role={person.role}
          />
        ),
    },
    {
      key: 'joined',
      label: 'Joined',
      cell: (person) => <Moment at={person.joinedAt} dateOnly className="text-ink-2" />,
    },
  ];
  if (changes !== null)
    columns.push({
      key: 'remove',
      label: 'Remove',
      labelHidden: true,
      className: 'md:text-right',
      cell: (person) => (
        <ConfirmDialog
          trigger={
            <Button size="small" variant="quiet" aria-label={`Remove ${person.name} from the team`}>
              Remove
            </Button>
          }
          title={`Remove ${person.name} from ${teamName}?`}
          confirmLabel={`Remove ${person.name}`}
          action={changes.removePerson}
          input={{ userId: person.userId }}
        >
          <p>
            {person.name} cannot see anything of this team from then on. Scans, fits and reviews by{' '}
            {person.name} stay, under the same name.
          </p>
          <p>Only a new invitation brings a person back.</p>
        </ConfirmDialog>
      ),
    });

  return (
    <DataTable
      caption={`People of ${teamName}`}
      captionHidden
      stacks
      columns={columns}
      rows={people}
      rowKey={(person) => person.userId}
    />
  );
}
