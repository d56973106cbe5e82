import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { AuditTable } from '@/components/team/audit-table';
import { InvitationTable } from '@/components/team/invitation-table';
import { InviteForm } from '@/components/team/invite-form';
import { PeopleTable } from '@/components/team/people-table';
import { ROLE_WORDS } from '@/components/team/role-words';
import { InventedMark } from '@/components/ui/invented-mark';
import { PageHeader } from '@/components/ui/page-header';
import { Section } from '@/components/ui/section';
import { mayAct } from '@/db/access/policy';
import { listAudit } from '@/db/access/team/list-audit';
import { readTeam } from '@/db/access/team/read-team';
import { ROLES } from '@/lib/schemas/common';

import { readViewer } from '../read-viewer';
import {
  cancelInvitationAction,
  changeRoleAction,
  invitePersonAction,
  removePersonAction,
} from './actions';

export const metadata: Metadata = { title: 'Team' };

export default async function TeamPage() {
  const [viewer, team] = await Promise.all([readViewer(), read(readTeam)]);
  const manages = mayAct(viewer, 'manage team');
  const people = team.people.length === 1 ? '1 person' : `${team.people.length} people`;
  return (
    <>
      <PageHeader
        title={team.name}
        badge={viewer.invented && <InventedMark />}
        meta={[people, `you are ${viewer.role}`]}
      />
      <Section title="People">
        <PeopleTable
          people={team.people}
          viewerId={viewer.userId}
          teamName={team.name}
          changes={
            manages ? { changeRole: changeRoleAction, removePerson: removePersonAction } : null
          }
        />
        <RolesExplained />
      </Section>
      {manages && (
        <Section title="Invite a person" className="prose-measure">
          <InviteForm action={invitePersonAction} />
          {team.invitations.length > 0 && (
            <InvitationTable invitations={team.invitations} cancel={cancelInvitationAction} />
          )}
        </Section>
      )}
      {manages && (
        <Section title="Audit trail">
          <AuditTable entries={await read(listAudit)} />
        </Section>
      )}
    </>
  );
}

function RolesExplained() {
  return (
    <details className="text-sm text-ink-2">
      <summary>What each role can do</summary>
      <dl className="grid gap-1 pt-2">
        {ROLES.map((role) => (
          <div key={role}>
            <dt className="inline font-semibold text-ink">{ROLE_WORDS[role].label}</dt>{' '}
            <dd className="inline">{ROLE_WORDS[role].can}.</dd>
          </div>
        ))}
      </dl>
      <p className="pt-2">Nobody decides on a fit of their own, owners included.</p>
    </details>
  );
}
