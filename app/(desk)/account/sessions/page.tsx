import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { SessionTable } from '@/components/person/session-table';
import { PageHeader } from '@/components/ui/page-header';
import { listSessions } from '@/db/access/person/list-sessions';

import { readViewer } from '../../read-viewer';
import { revokeSessionAction } from '../actions';

export const metadata: Metadata = { title: 'Sessions' };

export default async function SessionsPage() {
  const [viewer, sessions] = await Promise.all([readViewer(), read(listSessions)]);
  return (
    <>
      <PageHeader title="Sessions" meta={[viewer.name, viewer.email]} />
      <p className="prose-measure py-4 text-sm text-ink-2">
        Each browser where you are signed in. End the ones that you do not know or do not use; the
        browser there must then sign in again.
      </p>
      <SessionTable sessions={sessions} revoke={revokeSessionAction} />
    </>
  );
}
