import { litEnergyKeV } from '@/components/review/comment-targets';
import { ReviewView } from '@/components/review/review-view';
import { savedFitFigures } from '@/components/review/saved-fit-figures';
import { listFits } from '@/db/access/fit/list-fits';
import { readFit } from '@/db/access/fit/read-fit';
import { readSample } from '@/db/access/sample/read-sample';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';
import { read } from '@/app/_server/read';
import type { Metadata } from 'next';

import { readViewer } from '../../read-viewer';
import { acceptFitAction, commentFitAction, returnFitAction } from '../actions';

export async function generateMetadata({
  params,
}: PageProps<'/reviews/[fitId]'>): Promise<Metadata> {
  const fit = await read(readFit, { id: (await params).fitId });
  return { title: `Review of ${fit.name}` };
}

export default async function ReviewPage({ params, searchParams }: PageProps<'/reviews/[fitId]'>) {
  const fit = await read(readFit, { id: (await params).fitId });
  const [viewer, sample, stoppingSet, ofScan] = await Promise.all([
    readViewer(),
    read(readSample, { id: fit.sampleId }),
    read(readStoppingSet, { id: fit.stoppingSetId }),
    read(listFits, { scanId: fit.scanId }),
  ]);
  return (
    <ReviewView
      fit={fit}
      own={fit.createdById === viewer.userId}
      figures={savedFitFigures(fit, stoppingSet)}
      carrier={sample.carrier}
      others={ofScan.filter((other) => other.id !== fit.id)}
      now={new Date()}
      litKeV={litEnergyKeV((await searchParams).about)}
      actions={{
        accept: acceptFitAction,
        return: returnFitAction,
        comment: commentFitAction,
      }}
    />
  );
}
