import type { Metadata } from 'next';
import { cache } from 'react';

import { read } from '@/app/_server/read';
import { energySpan } from '@/components/scan/scan-words';
import { StoredProfiles } from '@/components/stopping/stored-profiles';
import { ActionButton } from '@/components/ui/action-button';
import { ButtonLink } from '@/components/ui/button-link';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { StateBadge } from '@/components/ui/state-badge';
import { KeptFile } from '@/components/upload/kept-file';
import { mayAct } from '@/db/access/policy';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';

import { readViewer } from '../../read-viewer';
import { archiveStoppingSetAction, restoreStoppingSetAction } from '../actions';

/** Title and page ask for the same set; it is read once. */
const readSet = cache((id: string) => read(readStoppingSet, { id }));

export async function generateMetadata({
  params,
}: PageProps<'/stopping/[setId]'>): Promise<Metadata> {
  const { setId } = await params;
  return { title: (await readSet(setId)).name };
}

export default async function StoppingSetPage({ params }: PageProps<'/stopping/[setId]'>) {
  const { setId } = await params;
  const [viewer, set] = await Promise.all([readViewer(), readSet(setId)]);
  const mayEdit = mayAct(viewer, 'edit data');
  const archived = set.archivedAt !== null;
  return (
    <>
      <PageHeader
        breadcrumb={[{ label: 'Stopping sets', href: '/stopping' }]}
        title={set.name}
        badge={
          <>
            {archived && <StateBadge state="archived" />}
            {set.invented && <InventedMark />}
          </>
        }
        meta={[
          set.layerStack,
          energySpan(set.energiesKeV),
          `${set.bins.toLocaleString('en')} depth bins`,
        ]}
        actions={
          mayEdit && (
            <>
              {!archived && <ButtonLink href={`/stopping/${set.id}/edit`}>Edit</ButtonLink>}
              {archived ? (
                <ActionButton
                  action={restoreStoppingSetAction}
                  input={{ id: set.id }}
                  pendingLabel="Restoring…"
                >
                  Restore
                </ActionButton>
              ) : (
                <ActionButton
                  variant="quiet"
                  action={archiveStoppingSetAction}
                  input={{ id: set.id }}
                  pendingLabel="Archiving…"
                >
                  Archive
                </ActionButton>
              )}
            </>
          )
        }
      />
      {archived && (
        <Notice kind="information" title="This stopping set is archived" className="mt-5">
          It is out of the lists; fits made with it stay as they are.
          {mayEdit && ' Restore takes it back.'}
        </Notice>
      )}
      <div className="grid grid-cols-1 gap-8 py-6">
        <StoredProfiles setId={set.id} energies={set.energiesKeV.length} />
        <section aria-labelledby="origin-heading" className="grid content-start gap-2">
          <h2 id="origin-heading">Where it comes from</h2>
          {set.origin !== '' && <p>{set.origin}</p>}
          {set.files.map((file) => (
            <KeptFile key={file.id} file={file} />
          ))}
          <p className="figures text-xs break-all text-ink-3">
            SHA-256 of the profiles {set.sha256}
          </p>
          <p className="text-sm text-ink-2">
            Added by {set.createdBy}, <Moment at={set.createdAt} />
          </p>
          {set.notes !== '' && (
            <p className="mt-2 prose-measure whitespace-pre-wrap">{set.notes}</p>
          )}
        </section>
      </div>
    </>
  );
}
