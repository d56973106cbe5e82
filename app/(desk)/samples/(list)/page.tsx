import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { allInvented } from '@/components/sample/all-invented';
import { SampleSearch } from '@/components/sample/sample-search';
import { SampleTable } from '@/components/sample/sample-table';
import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { InventedMark } from '@/components/ui/invented-mark';
import { PageHeader } from '@/components/ui/page-header';
import { mayAct } from '@/db/access/policy';
import { listSamples } from '@/db/access/sample/list-samples';

import { readViewer } from '../../read-viewer';

export const metadata: Metadata = { title: 'Samples' };

export default async function SamplesPage({ searchParams }: PageProps<'/samples'>) {
  const query = await searchParams;
  const archived = query.archived === 'yes';
  const words = typeof query.q === 'string' ? query.q.trim() : '';
  const [viewer, all] = await Promise.all([readViewer(), read(listSamples, { archived })]);
  const mayEdit = mayAct(viewer, 'edit data');
  const found = all.filter((sample) => matches(sample, words));

  return (
    <>
      <PageHeader
        title={archived ? 'Archived samples' : 'Samples'}
        badge={allInvented(found) && <InventedMark />}
        breadcrumb={archived ? [{ label: 'Samples', href: '/samples' }] : []}
        actions={
          mayEdit && (
            <ButtonLink variant="primary" href="/samples/new">
              Add a sample
            </ButtonLink>
          )
        }
      />
      <SampleSearch words={words} archived={archived} />
      {found.length > 0 ? (
        <SampleTable caption={archived ? 'Archived samples' : 'Samples'} samples={found} />
      ) : (
        <NothingFound words={words} archived={archived} mayEdit={mayEdit} />
      )}
    </>
  );
}

function matches(
  sample: { name: string; material: string; treatment: string },
  words: string,
): boolean {
  const text = `${sample.name} ${sample.material} ${sample.treatment}`.toLowerCase();
  return words
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));
}

type NothingFoundProps = { words: string; archived: boolean; mayEdit: boolean };

function NothingFound({ words, archived, mayEdit }: NothingFoundProps) {
  if (words !== '')
    return (
      <EmptyState
        title={`No sample has “${words}” in its name, material or treatment.`}
        action={
          <ButtonLink href={archived ? '/samples?archived=yes' : '/samples'}>Show all</ButtonLink>
        }
      />
    );
  if (archived) return <EmptyState title="Nothing is archived." />;
  return (
    <EmptyState
      title="No samples yet."
      text={
        <p>
          A sample is a wafer or a piece of one. Its energy scans, fits and issued profiles hang on
          it.
        </p>
      }
      action={
        mayEdit && (
          <ButtonLink variant="primary" href="/samples/new">
            Add the first sample
          </ButtonLink>
        )
      }
    />
  );
}
