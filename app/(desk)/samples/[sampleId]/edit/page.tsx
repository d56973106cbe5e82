import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { SampleForm } from '@/components/sample/sample-form';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { mayAct } from '@/db/access/policy';
import { readSample } from '@/db/access/sample/read-sample';

import { readViewer } from '../../../read-viewer';
import { editSampleAction } from '../../actions';

export const metadata: Metadata = { title: 'Edit a sample' };

export default async function EditSamplePage({ params }: PageProps<'/samples/[sampleId]/edit'>) {
  const { sampleId } = await params;
  const [viewer, sample] = await Promise.all([readViewer(), read(readSample, { id: sampleId })]);
  const home = `/samples/${sample.id}`;
  return (
    <>
      <PageHeader
        title={`Edit ${sample.name}`}
        breadcrumb={[
          { label: 'Samples', href: '/samples' },
          { label: sample.name, href: home },
        ]}
      />
      <div className="grid prose-measure gap-6 pt-6">
        {mayAct(viewer, 'edit data') ? (
          <>
            <p className="text-sm text-ink-2">
              Fits already made keep the numbers that they were made with.
            </p>
            <SampleForm action={editSampleAction} sample={sample} cancelHref={home} />
          </>
        ) : (
          <Notice kind="caution" title="Not with your role">
            Only analysts and owners edit samples. You are {viewer.role} in {viewer.teamName}.
          </Notice>
        )}
      </div>
    </>
  );
}
