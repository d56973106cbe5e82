import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { AddScanForm } from '@/components/scan/add-scan-form';
import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { mayAct } from '@/db/access/policy';
import { listSamples } from '@/db/access/sample/list-samples';

import { readViewer } from '../../read-viewer';

export const metadata: Metadata = { title: 'Add an energy scan' };

export default async function AddScanPage({ searchParams }: PageProps<'/scans/new'>) {
  const { sample: sampleId } = await searchParams;
  const viewer = await readViewer();
  const samples = await read(listSamples);
  const sample = samples.find(({ id }) => id === sampleId);
  const breadcrumb = [
    { label: 'Samples', href: '/samples' },
    ...(sample ? [{ label: sample.name, href: `/samples/${sample.id}` }] : []),
  ];
  return (
    <>
      <PageHeader breadcrumb={breadcrumb} title="Add an energy scan" />
      {!mayAct(viewer, 'edit data') ? (
        <Notice kind="information" className="mt-6">
          Analysts and owners add scans. Ask one of them, or an owner for another role.
        </Notice>
      ) : samples.length === 0 ? (
        <EmptyState
          className="border-t-0"
          title="A scan belongs to a sample, and there is none yet"
          text="Describe the wafer first: material, carriers, doping and cap layer."
          action={
            <ButtonLink variant="primary" href="/samples/new">
              Add a sample
            </ButtonLink>
          }
        />
      ) : (
        <AddScanForm
          samples={samples.map(({ id, name }) => ({ id, name }))}
          sampleId={sample?.id ?? null}
        />
      )}
    </>
  );
}
