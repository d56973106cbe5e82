import { ReviewQueue } from '@/components/review/review-queue';
import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { readFit } from '@/db/access/fit/read-fit';
import { listReviews } from '@/db/access/review/list-reviews';
import { read } from '@/app/_server/read';
import type { Metadata } from 'next';

import { readViewer } from '../read-viewer';

export const metadata: Metadata = { title: 'Reviews' };

export default async function ReviewsPage() {
  const [viewer, waiting] = await Promise.all([readViewer(), read(listReviews)]);
  const fits = await Promise.all(waiting.map(({ id }) => read(readFit, { id })));
  const others = fits.filter((fit) => fit.createdById !== viewer.userId).length;
  return (
    <>
      <PageHeader
        title="Reviews"
        meta={fits.length > 0 ? [waitingWords(fits.length, others)] : undefined}
      />
      {fits.length === 0 ? (
        <EmptyState
          title="Nothing waits for review."
          text="A fit appears here when an analyst sends it to review. What was accepted becomes an issued profile."
          action={<ButtonLink href="/profiles">Go to the issued profiles</ButtonLink>}
        />
      ) : (
        <div className="pt-6">
          <ReviewQueue fits={fits} viewerId={viewer.userId} now={new Date()} />
        </div>
      )}
    </>
  );
}

function waitingWords(all: number, others: number): string {
  const fits = all === 1 ? '1 fit waits' : `${all} fits wait`;
  const own = all - others;
  return own === 0 ? fits : `${fits}, ${own === 1 ? '1 of them' : `${own} of them`} yours`;
}
