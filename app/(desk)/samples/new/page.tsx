import type { Metadata } from 'next';

import { SampleForm } from '@/components/sample/sample-form';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { mayAct } from '@/db/access/policy';

import { readViewer } from '../../read-viewer';
import { createSampleAction } from '../actions';

export const metadata: Metadata = { title: 'New sample' };

export default async function NewSamplePage() {
  const viewer = await readViewer();
  return (
    <>
      <PageHeader title="New sample" breadcrumb={[{ label: 'Samples', href: '/samples' }]} />
      <div className="prose-measure pt-6">
        {mayAct(viewer, 'edit data') ? (
          <SampleForm action={createSampleAction} cancelHref="/samples" />
        ) : (
          <Notice kind="caution" title="Not with your role">
            Only analysts and owners add samples. You are {viewer.role} in {viewer.teamName}.
          </Notice>
        )}
      </div>
    </>
  );
}
