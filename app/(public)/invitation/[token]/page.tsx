import type { Metadata } from 'next';
import { notFound } from 'next/navigation';

import { read } from '@/app/_server/read';
import { EntrySheet } from '@/components/person/entry-sheet';
import { InvitationForm } from '@/components/person/invitation-form';
import { ROLE_WORDS } from '@/components/team/role-words';
import { readInvitation } from '@/db/access/person/read-invitation';
import { readInvitationSchema } from '@/lib/schemas/person';

import { acceptInvitationAction } from '../../actions';

export const metadata: Metadata = { title: 'Invitation', referrer: 'no-referrer' };

export default async function InvitationPage({ params }: PageProps<'/invitation/[token]'>) {
  const { token } = await params;
  if (!readInvitationSchema.safeParse({ token }).success) notFound();
  const invitation = await read(readInvitation, { token });
  const role = ROLE_WORDS[invitation.role];
  return (
    <EntrySheet
      title={`Join ${invitation.teamName}`}
      lead={
        <>
          You are invited as{' '}
          <strong className="font-semibold text-ink">{role.label.toLowerCase()}</strong>: {role.can}
          .
          {invitation.known && ' You have an account already; your password joins it to this team.'}
        </>
      }
    >
      <InvitationForm action={acceptInvitationAction} token={token} invitation={invitation} />
    </EntrySheet>
  );
}
