import type { Metadata } from 'next';

import { AddStoppingForm } from '@/components/stopping/add-stopping-form';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { mayAct } from '@/db/access/policy';

import { readViewer } from '../../read-viewer';

export const metadata: Metadata = { title: 'Add a stopping set' };

export default async function AddStoppingPage() {
  const viewer = await readViewer();
  return (
    <>
      <PageHeader
        breadcrumb={[{ label: 'Stopping sets', href: '/stopping' }]}
        title="Add a stopping set"
      />
      {mayAct(viewer, 'edit data') ? (
        <AddStoppingForm />
      ) : (
        <Notice kind="information" className="mt-6">
          Analysts and owners add stopping sets. Ask one of them, or an owner for another role.
        </Notice>
      )}
    </>
  );
}
