import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { SampleFacts } from '@/components/sample/sample-facts';
import { FitTable } from '@/components/sample/fit-table';
import { IssuedTable } from '@/components/sample/issued-table';
import { ScanTable } from '@/components/sample/scan-table';
import { ActionButton } from '@/components/ui/action-button';
import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { Section } from '@/components/ui/section';
import { StateBadge } from '@/components/ui/state-badge';
import { listFits } from '@/db/access/fit/list-fits';
import { mayAct } from '@/db/access/policy';
import { listIssuedProfiles } from '@/db/access/profile/list-issued-profiles';
import { readSample } from '@/db/access/sample/read-sample';
import { listScans } from '@/db/access/scan/list-scans';

import { readViewer } from '../../read-viewer';
import { archiveSampleAction, restoreSampleAction } from '../actions';

export async function generateMetadata({
  params,
}: PageProps<'/samples/[sampleId]'>): Promise<Metadata> {
  const sample = await read(readSample, { id: (await params).sampleId });
  return { title: sample.name };
}

export default async function SamplePage({ params }: PageProps<'/samples/[sampleId]'>) {
  const { sampleId } = await params;
  const [viewer, sample, scans, archivedScans, fits, issued] = await Promise.all([
    readViewer(),
    read(readSample, { id: sampleId }),
    read(listScans, { sampleId }),
    read(listScans, { sampleId, archived: true }),
    read(listFits, { sampleId }),
    read(listIssuedProfiles),
  ]);
  const mayEdit = mayAct(viewer, 'edit data');
  const mayFit = mayAct(viewer, 'fit');
  const own = issued.filter((profile) => profile.sampleId === sample.id);
  const addScan = `/scans/new?sample=${sample.id}`;

  return (
    <>
      <PageHeader
        breadcrumb={[{ label: 'Samples', href: '/samples' }]}
        title={sample.name}
        badge={
          <>
            {sample.archivedAt && <StateBadge state="archived" />}
            {sample.invented && <InventedMark />}
          </>
        }
        meta={[
          sample.material,
          <>
            added by {sample.createdBy}, <Moment at={sample.createdAt} dateOnly />
          </>,
        ]}
        actions={
          mayEdit && !sample.archivedAt ? (
            <>
              <ActionButton
                action={archiveSampleAction}
                input={{ id: sample.id }}
                pendingLabel="Archiving …"
              >
                Archive
              </ActionButton>
              <ButtonLink href={`/samples/${sample.id}/edit`}>Edit</ButtonLink>
              <ButtonLink variant="primary" href={addScan}>
                Add an energy scan
              </ButtonLink>
            </>
          ) : null
        }
      />
      {sample.archivedAt && (
        <Notice
          kind="information"
          title="Archived"
          className="mt-4"
          action={
            mayEdit && (
              <ActionButton
                size="small"
                action={restoreSampleAction}
                input={{ id: sample.id }}
                pendingLabel="Restoring …"
              >
                Undo: restore the sample
              </ActionButton>
            )
          }
        >
          It is out of the lists since <Moment at={sample.archivedAt} />. Nothing was deleted.
        </Notice>
      )}
      <SampleFacts sample={sample} />
      <Section title="Energy scans">
        {scans.length > 0 ? (
          <ScanTable caption={`Energy scans of ${sample.name}`} scans={scans} mayFit={mayFit} />
        ) : (
          <EmptyState
            title="No energy scan yet."
            text={<p>A scan is a file, or typed points, with energy, value and uncertainty.</p>}
            action={
              mayEdit && !sample.archivedAt ? (
                <ButtonLink href={addScan}>Add an energy scan</ButtonLink>
              ) : null
            }
          />
        )}
        {archivedScans.length > 0 && (
          <details>
            <summary className="text-sm text-ink-2">{archivedScans.length} archived</summary>
            <ScanTable caption="Archived energy scans" scans={archivedScans} mayFit={false} />
          </details>
        )}
      </Section>
      <Section title="Fits">
        {fits.length > 0 ? (
          <FitTable caption={`Fits of ${sample.name}`} fits={fits} withSample={false} />
        ) : (
          <p className="text-sm text-ink-2">
            {scans.length > 0
              ? 'No fit yet. Press Fit beside a scan.'
              : 'A fit needs a scan first.'}
          </p>
        )}
      </Section>
      <Section title="Issued profiles">
        {own.length > 0 ? (
          <IssuedTable
            caption={`Issued profiles of ${sample.name}`}
            profiles={own}
            withSample={false}
          />
        ) : (
          <p className="text-sm text-ink-2">
            None yet. A fit that a reviewer accepts becomes an issued profile.
          </p>
        )}
      </Section>
    </>
  );
}
