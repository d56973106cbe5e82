import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { StoppingList } from '@/components/stopping/stopping-list';
import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { TextLink } from '@/components/ui/text-link';
import { mayAct } from '@/db/access/policy';
import { listStoppingSets } from '@/db/access/stopping-set/list-stopping-sets';

import { readViewer } from '../read-viewer';

export const metadata: Metadata = { title: 'Stopping sets' };

export default async function StoppingSetsPage({ searchParams }: PageProps<'/stopping'>) {
  const archived = (await searchParams).archived === 'yes';
  const [viewer, sets] = await Promise.all([readViewer(), read(listStoppingSets, { archived })]);
  const mayAdd = mayAct(viewer, 'edit data');
  const add = (
    <ButtonLink variant="primary" href="/stopping/new">
      Add a stopping set
    </ButtonLink>
  );
  return (
    <>
      <PageHeader
        breadcrumb={archived ? [{ label: 'Stopping sets', href: '/stopping' }] : []}
        title={archived ? 'Archived stopping sets' : 'Stopping sets'}
        meta={['How deep the muons stop in a layer stack, energy by energy']}
        actions={!archived && mayAdd && sets.length > 0 && add}
      />
      <div className="grid gap-6 py-6">
        {sets.length > 0 ? (
          <StoppingList sets={sets} />
        ) : archived ? (
          <NoneArchived />
        ) : (
          <NoneYet action={mayAdd && add} />
        )}
        {!archived && (
          <p className="text-sm">
            <TextLink href="/stopping?archived=yes">Archived stopping sets</TextLink>
          </p>
        )}
      </div>
    </>
  );
}

function NoneYet({ action }: { action: React.ReactNode }) {
  return (
    <EmptyState
      className="border-t-0 py-2"
      title="No stopping sets yet"
      text="A fit needs the stopping profiles of the layer stack: one matrix file, or one file per energy. A set serves all scans of samples with that stack."
      action={action}
    />
  );
}

function NoneArchived() {
  return (
    <EmptyState
      className="border-t-0 py-2"
      title="Nothing is archived"
      text="A set that is archived leaves the lists and can be taken back here."
    />
  );
}
