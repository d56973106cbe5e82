import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { EditScanForm } from '@/components/scan/edit-scan-form';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { mayAct } from '@/db/access/policy';
import { readScan } from '@/db/access/scan/read-scan';

import { readViewer } from '../../../read-viewer';

export const metadata: Metadata = { title: 'Edit scan' };

export default async function EditScanPage({ params }: PageProps<'/scans/[scanId]/edit'>) {
  const { scanId } = await params;
  const [viewer, scan] = await Promise.all([readViewer(), read(readScan, { id: scanId })]);
  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: 'Samples', href: '/samples' },
          { label: scan.sampleName, href: `/samples/${scan.sampleId}` },
          { label: scan.name, href: `/scans/${scan.id}` },
        ]}
        title="Edit scan"
      />
      {mayAct(viewer, 'edit data') ? (
        <EditScanForm scan={scan} />
      ) : (
        <Notice kind="information" className="mt-6">
          Analysts and owners change scans. Your role reads them.
        </Notice>
      )}
    </>
  );
}
