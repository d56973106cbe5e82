import type { Metadata } from 'next';
import { cache } from 'react';

import { read } from '@/app/_server/read';
import { FitActions } from '@/components/fit-desk/fit-actions';
import { SavedFitDesk } from '@/components/fit-desk/saved-fit-desk';
import { SavedFitNotices } from '@/components/fit-desk/saved-fit-notices';
import { scanSentence } from '@/components/fit-desk/scan-sentence';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { PageHeader } from '@/components/ui/page-header';
import { StateBadge } from '@/components/ui/state-badge';
import { readFit } from '@/db/access/fit/read-fit';
import { readSample } from '@/db/access/sample/read-sample';
import { readScan } from '@/db/access/scan/read-scan';

import { submitFitAction } from '../../reviews/actions';
import { discardFitAction } from '../actions';

/** Title and page ask for the same fit; it is read once. */
const readOne = cache((id: string) => read(readFit, { id }));

export async function generateMetadata({ params }: PageProps<'/fits/[fitId]'>): Promise<Metadata> {
  return { title: (await readOne((await params).fitId)).name };
}

export default async function FitPage({ params }: PageProps<'/fits/[fitId]'>) {
  const fit = await readOne((await params).fitId);
  const [sample, scan] = await Promise.all([
    read(readSample, { id: fit.sampleId }),
    read(readScan, { id: fit.scanId }),
  ]);
  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: 'Fits', href: '/fits' },
          { label: fit.sampleName, href: `/samples/${fit.sampleId}` },
          { label: fit.scanName, href: `/scans/${fit.scanId}` },
        ]}
        title={fit.name}
        badge={
          <>
            <StateBadge state={fit.state} />
            {fit.invented && <InventedMark />}
          </>
        }
        meta={[
          scanSentence({ ...scan, points: fit.points }),
          <>
            frozen by {fit.createdBy}, <Moment at={fit.createdAt} />
          </>,
        ]}
        actions={<FitActions fit={fit} submit={submitFitAction} discard={discardFitAction} />}
      />
      <SavedFitNotices fit={fit} />
      <SavedFitDesk fit={fit} sample={sample} />
    </>
  );
}
