import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { FitFilter } from '@/components/fit-desk/fit-filter';
import { FitList } from '@/components/fit-desk/fit-list';
import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { listFits } from '@/db/access/fit/list-fits';
import { mayAct } from '@/db/access/policy';
import { FIT_STATES } from '@/lib/schemas/fit';

import { readViewer } from '../read-viewer';

export const metadata: Metadata = { title: 'Fits' };

export default async function FitsPage({ searchParams }: PageProps<'/fits'>) {
  const query = await searchParams;
  const state = FIT_STATES.find((known) => known === query.state) ?? null;
  const [viewer, fits] = await Promise.all([readViewer(), read(listFits)]);
  const shown = state === null ? fits : fits.filter((fit) => fit.state === state);
  const mayFit = mayAct(viewer, 'fit');
  return (
    <>
      <PageHeader
        title="Fits"
        actions={
          mayFit && (
            <ButtonLink href="/fits/new" variant="primary">
              New fit
            </ButtonLink>
          )
        }
      />
      {fits.length === 0 ? (
        <EmptyState
          title="No fit has been saved yet."
          text={
            mayFit
              ? 'Choose an energy scan, fit it on the desk and save what you want to keep.'
              : 'Analysts of the team save their fits here.'
          }
          action={mayFit && <ButtonLink href="/fits/new">Choose a scan</ButtonLink>}
        />
      ) : (
        <>
          <FitFilter fits={fits} state={state} />
          {shown.length === 0 ? (
            <EmptyState title="No fit is in this state." text="Choose another state above." />
          ) : (
            <FitList fits={shown} />
          )}
        </>
      )}
    </>
  );
}
