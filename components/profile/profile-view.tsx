import { FigureDataTable } from '@/components/charts/figure-data-table';
import { CheckList } from '@/components/review/check-list';
import { drawnFit, fileNameOf } from '@/components/review/drawn-fit';
import { EdgeAnswer } from '@/components/review/edge-answer';
import { SavedScanFigure } from '@/components/review/fit-figures';
import { carrierTable } from '@/components/review/fit-tables';
import { ParameterTable } from '@/components/review/parameter-table';
import type { SavedFitFigures } from '@/components/review/saved-fit-figures';
import { scaleErrorOf } from '@/components/review/scale-error';
import { SettingList } from '@/components/review/setting-list';
import { Thread } from '@/components/review/thread';
import { ButtonLink } from '@/components/ui/button-link';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { PageHeader } from '@/components/ui/page-header';
import { Section } from '@/components/ui/section';
import { StateBadge } from '@/components/ui/state-badge';
import type { IssuedProfile } from '@/lib/schemas/profile';

import { Citation } from './citation';
import type { ExportChoice } from './export-choice';
import { ExportHistory } from './export-history';
import { ExportPanel } from './export-panel';
import { ProfileCautions } from './profile-cautions';
import { ProfileFigure } from './profile-figure';
import { Provenance, type OriginalFile } from './provenance';

interface ProfileViewProps {
  profile: IssuedProfile;
  figures: SavedFitFigures;
  carrier: 'electrons' | 'holes';
  scanFile: OriginalFile | null;
  stoppingFiles: OriginalFile[];
  choice: ExportChoice;
  maxRows: number;
}

/** An issued profile: the answer, how to cite it, how to take it away, and where it comes from. */
export function ProfileView(props: ProfileViewProps) {
  const { profile, figures, carrier, scanFile, stoppingFiles, choice, maxRows } = props;
  const { fit } = profile;
  const drawn = drawnFit(fit);
  const fileName = fileNameOf(profile.number);
  const { points } = fit.carrierProfile;
  const scale = scaleErrorOf(fit.spec);
  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: 'Issued profiles', href: '/profiles' },
          { label: profile.sampleName, href: `/samples/${profile.sampleId}` },
        ]}
        title={profile.number}
        badge={
          <>
            <StateBadge state="accepted" />
            {profile.invented && <InventedMark />}
          </>
        }
        meta={[
          `${profile.sampleName}, ${profile.material}`,
          profile.scanName,
          `${profile.profile} edge, ${fit.spec.polarity}`,
          <span key="at">
            issued <Moment at={profile.issuedAt} dateOnly />
          </span>,
        ]}
        actions={
          <>
            <ButtonLink href="#cite">Cite</ButtonLink>
            <ButtonLink variant="primary" href="#export">
              Export
            </ButtonLink>
          </>
        }
      />
      <div className="grid gap-x-10 gap-y-6 pt-6 lg:grid-cols-2 print:grid-cols-2">
        <EdgeAnswer edge={profile.edge} width={profile.width} polarity={fit.spec.polarity} />
        <ProfileCautions profile={fit.carrierProfile} />
      </div>
      <div className="grid gap-x-10 gap-y-2 pt-2 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="min-w-0">
          <div className="pt-6">
            <ProfileFigure fit={drawn} carrier={carrier} fileName={fileName} />
            {scale && <p className="mt-1 text-[0.8125rem] text-ink-2">{scale.sentence}</p>}
            <details className="no-print mt-3 text-sm">
              <summary className="w-fit text-ink-2">Data, {points.length} depths</summary>
              <FigureDataTable caption="Carrier profile" table={carrierTable(fit.carrierProfile)} />
            </details>
          </div>
          <Section title="Parameters">
            <ParameterTable fit={fit} />
          </Section>
          <div className="pt-7">
            <SavedScanFigure fit={drawn} figures={figures} fileName={fileName} />
          </div>
        </div>
        <div className="min-w-0 print:columns-2 print:gap-8">
          <Section title="Cite it as" id="cite">
            <Citation text={profile.citation} />
          </Section>
          <Section title="Export" id="export" className="no-print">
            <ExportPanel
              profileId={profile.id}
              number={profile.number}
              profile={fit.carrierProfile}
              initial={choice}
              maxRows={maxRows}
            />
          </Section>
          <Section title="Checks">
            <CheckList checks={fit.checks} />
          </Section>
          <Section title="What is assumed">
            <SettingList fit={fit} />
          </Section>
          <Section title="Provenance">
            <Provenance profile={profile} scanFile={scanFile} stoppingFiles={stoppingFiles} />
          </Section>
          <Section title="History">
            <Thread events={fit.events} />
            <ExportHistory exports={profile.exports} />
          </Section>
        </div>
      </div>
    </>
  );
}
