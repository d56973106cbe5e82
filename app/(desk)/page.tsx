import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { FirstSteps } from '@/components/home/first-steps';
import { WaitingList } from '@/components/home/waiting-list';
import { allInvented } from '@/components/sample/all-invented';
import { FitTable } from '@/components/sample/fit-table';
import { IssuedTable } from '@/components/sample/issued-table';
import { SampleTable } from '@/components/sample/sample-table';
import { ButtonLink } from '@/components/ui/button-link';
import { InventedMark } from '@/components/ui/invented-mark';
import { PageHeader } from '@/components/ui/page-header';
import { Section } from '@/components/ui/section';
import { TextLink } from '@/components/ui/text-link';
import { readHome } from '@/db/access/home/read-home';
import { mayAct } from '@/db/access/policy';
import type { Role } from '@/lib/schemas/common';

import { readViewer } from './read-viewer';

export const metadata: Metadata = { title: { absolute: 'Home · Strandline' } };

const NOTHING_WAITS: Record<Role, string> = {
  owner:
    'Nothing waits for you. Fits that others send to review show here, and so do your own drafts.',
  analyst: 'Nothing waits for you. Your drafts and the fits returned to you show here.',
  reviewer: 'Nothing waits for you. Fits that are sent to review show here.',
  modeller: 'Nothing waits for you. The newest issued profiles are below.',
};

export default async function HomePage() {
  const [viewer, home] = await Promise.all([readViewer(), read(readHome)]);
  const mayEdit = mayAct(viewer, 'edit data');
  const firstRun = mayEdit && home.counts.fits === 0;
  return (
    <>
      <PageHeader
        title={viewer.teamName}
        badge={viewer.invented && <InventedMark />}
        meta={[
          counted(home.counts.samples, 'sample'),
          counted(home.counts.scans, 'energy scan'),
          counted(home.counts.stoppingSets, 'stopping set'),
          counted(home.counts.fits, 'fit'),
        ]}
        actions={
          mayEdit && !firstRun ? (
            <>
              <ButtonLink href="/samples/new">Add a sample</ButtonLink>
              <ButtonLink variant="primary" href="/fits/new">
                New fit
              </ButtonLink>
            </>
          ) : null
        }
      />
      {firstRun ? (
        <Section title="From files to a first profile">
          <FirstSteps counts={home.counts} />
        </Section>
      ) : (
        <Section title="Waits for you" badge={markFor(home.waiting)}>
          {home.waiting.length > 0 ? (
            <WaitingList fits={home.waiting} />
          ) : (
            <p className="text-sm text-ink-2">{NOTHING_WAITS[viewer.role]}</p>
          )}
        </Section>
      )}
      {home.recentProfiles.length > 0 && (
        <Section
          title="Newest issued profiles"
          badge={markFor(home.recentProfiles)}
          actions={<TextLink href="/profiles">All</TextLink>}
        >
          <IssuedTable caption="Newest issued profiles" profiles={home.recentProfiles} />
        </Section>
      )}
      {home.recentFits.length > 0 && (
        <Section
          title="Recent fits"
          badge={markFor(home.recentFits)}
          actions={<TextLink href="/fits">All</TextLink>}
        >
          <FitTable caption="Recent fits" fits={home.recentFits} />
        </Section>
      )}
      {home.samples.length > 0 && (
        <Section
          title="Samples"
          badge={markFor(home.samples)}
          actions={<TextLink href="/samples">All</TextLink>}
        >
          <SampleTable caption="Samples" samples={home.samples} />
        </Section>
      )}
    </>
  );
}

function markFor(rows: readonly { invented: boolean }[]) {
  return allInvented(rows) && <InventedMark />;
}

function counted(count: number, what: string): string {
  return `${count} ${what}${count === 1 ? '' : 's'}`;
}
