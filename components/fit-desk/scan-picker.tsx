import Link from 'next/link';

import { ButtonLink } from '@/components/ui/button-link';
import { DataTable } from '@/components/ui/data-table';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import type { Scan } from '@/lib/schemas/scan';

import { scanSentence } from './scan-sentence';

/** A fit begins with a scan: which one? */
export function ScanPicker({ scans }: { scans: readonly Scan[] }) {
  return (
    <>
      <PageHeader breadcrumb={[{ label: 'Fits', href: '/fits' }]} title="New fit" />
      {scans.length === 0 ? (
        <EmptyState
          title="There is no energy scan to fit yet."
          text="A fit begins with an energy scan of a sample. Open a sample and add its scan; then come back."
          action={
            <ButtonLink href="/samples" variant="primary">
              Go to the samples
            </ButtonLink>
          }
        />
      ) : (
        <DataTable
          caption="Choose the scan to fit"
          className="pt-5"
          rows={scans}
          rowKey={({ id }) => id}
          columns={[
            {
              key: 'scan',
              label: 'Scan',
              rowHeader: true,
              cell: (scan) => (
                <Link href={`/fits/new?scan=${scan.id}`} className="text-link">
                  {scan.name}
                </Link>
              ),
            },
            { key: 'sample', label: 'Sample', cell: (scan) => scan.sampleName },
            {
              key: 'observable',
              label: 'Observable',
              cell: (scan) =>
                scan.observable === 'rate' ? 'capture rate' : 'diamagnetic fraction',
            },
            { key: 'what', label: 'Points', cell: scanSentence },
          ]}
        />
      )}
    </>
  );
}
