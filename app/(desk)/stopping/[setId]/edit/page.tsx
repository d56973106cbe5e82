import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { EditStoppingForm } from '@/components/stopping/edit-stopping-form';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { mayAct } from '@/db/access/policy';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';

import { readViewer } from '../../../read-viewer';
import { editStoppingSetAction } from '../../actions';

export const metadata: Metadata = { title: 'Edit stopping set' };

export default async function EditStoppingPage({ params }: PageProps<'/stopping/[setId]/edit'>) {
  const { setId } = await params;
  const [viewer, set] = await Promise.all([readViewer(), read(readStoppingSet, { id: setId })]);
  // The profiles may be megabytes and do not change here.
  const { profiles: _profiles, ...row } = set;
  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: 'Stopping sets', href: '/stopping' },
          { label: set.name, href: `/stopping/${set.id}` },
        ]}
        title="Edit stopping set"
        meta={['Profiles and files stay as they were uploaded; a changed set is a new set']}
      />
      <div className="py-6">
        {mayAct(viewer, 'edit data') ? (
          <EditStoppingForm set={row} action={editStoppingSetAction} />
        ) : (
          <Notice kind="information">
            Analysts and owners change stopping sets. Your role reads them.
          </Notice>
        )}
      </div>
    </>
  );
}
