import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { allInvented } from '@/components/sample/all-invented';
import { CompareLinks } from '@/components/sample/compare-links';
import { FitTable } from '@/components/sample/fit-table';
import { IssuedTable } from '@/components/sample/issued-table';
import { SampleFacts } from '@/components/sample/sample-facts';
import { ScanSection } from '@/components/sample/scan-section';
import { ActionButton } from '@/components/ui/action-button';
import { ButtonLink } from '@/components/ui/button-link';
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
import type { SampleRow } from '@/lib/schemas/sample';

import { readViewer } from '../../read-viewer';
import { archiveSampleAction, restoreSampleAction } from '../actions';

type Props = PageProps<'/samples/[sampleId]'>;

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const sample = await read(readSample, { id: (await params).sampleId });
  return { title: sample.name };
}

export default async function SamplePage({ params }: Props) {
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
  const ofSample = issued.filter((profile) => profile.sampleId === sample.id);

  return (
    <>
      <SampleHeader sample={sample} mayEdit={mayEdit} />
      {sample.archivedAt && <Archived sample={sample} mayEdit={mayEdit} />}
      <SampleFacts sample={sample} />
      <ScanSection
        sample={sample}
        scans={scans}
        archivedScans={archivedScans}
        mayAdd={mayEdit && sample.archivedAt === null}
        mayFit={mayAct(viewer, 'fit')}
      />
      <Section
        title="Fits"
        badge={allInvented(fits) && <InventedMark />}
        actions={<CompareLinks fits={fits} />}
      >
        {fits.length > 0 ? (
          <FitTable caption={`Fits of ${sample.name}`} fits={fits} withSample={false} />
        ) : (
          <p className="text-sm text-ink-2">
            {scans.length > 0 ? 'No fit yet.' : 'A fit needs an energy scan first.'}
          </p>
        )}
      </Section>
      <Section title="Issued profiles" badge={allInvented(ofSample) && <InventedMark />}>
        {ofSample.length > 0 ? (
          <IssuedTable
            caption={`Issued profiles of ${sample.name}`}
            profiles={ofSample}
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

type PartProps = { sample: SampleRow; mayEdit: boolean };

function SampleHeader({ sample, mayEdit }: PartProps) {
  const input = { id: sample.id };
  return (
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
        mayEdit && sample.archivedAt === null ? (
          <>
            <ActionButton action={archiveSampleAction} input={input} pendingLabel="Archiving …">
              Archive
            </ActionButton>
            <ButtonLink href={`/samples/${sample.id}/edit`}>Edit</ButtonLink>
            <ButtonLink variant="primary" href={`/scans/new?sample=${sample.id}`}>
              Add an energy scan
            </ButtonLink>
          </>
        ) : null
      }
    />
  );
}

function Archived({ sample, mayEdit }: PartProps) {
  return (
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
      It is out of the lists
      {sample.archivedAt && (
        <>
          {' '}
          since <Moment at={sample.archivedAt} />
        </>
      )}
      . Nothing was deleted.
    </Notice>
  );
}
