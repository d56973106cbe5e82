import type { Metadata } from 'next';
import { cache } from 'react';

import { read } from '@/app/_server/read';
import { FitThisScan } from '@/components/scan/fit-this-scan';
import { PointsTable } from '@/components/scan/points-table';
import { ScanFigure } from '@/components/scan/scan-figure';
import { ScanFits } from '@/components/scan/scan-fits';
import { conditionWords, energySpan, OBSERVABLE_WORDS } from '@/components/scan/scan-words';
import { ActionButton } from '@/components/ui/action-button';
import { ButtonLink } from '@/components/ui/button-link';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { StateBadge } from '@/components/ui/state-badge';
import { KeptFile } from '@/components/upload/kept-file';
import { listFits } from '@/db/access/fit/list-fits';
import { mayAct } from '@/db/access/policy';
import { readScan } from '@/db/access/scan/read-scan';
import { listStoppingSets } from '@/db/access/stopping-set/list-stopping-sets';
import { asEntered } from '@/lib/format';

import { readViewer } from '../../read-viewer';
import { archiveScanAction, restoreScanAction } from '../actions';

/** Title and page ask for the same scan; it is read once. */
const readOne = cache((id: string) => read(readScan, { id }));

export async function generateMetadata({
  params,
}: PageProps<'/scans/[scanId]'>): Promise<Metadata> {
  const { scanId } = await params;
  return { title: (await readOne(scanId)).name };
}

export default async function ScanPage({ params }: PageProps<'/scans/[scanId]'>) {
  const { scanId } = await params;
  const [viewer, scan] = await Promise.all([readViewer(), readOne(scanId)]);
  const [fits, sets] = await Promise.all([read(listFits, { scanId }), read(listStoppingSets)]);
  const energiesKeV = scan.points
    .filter(({ enabled }) => enabled)
    .map(({ energyKeV }) => energyKeV);
  const mayEdit = mayAct(viewer, 'edit data');
  const archived = scan.archivedAt !== null;
  const off = scan.points.length - energiesKeV.length;
  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: 'Samples', href: '/samples' },
          { label: scan.sampleName, href: `/samples/${scan.sampleId}` },
        ]}
        title={scan.name}
        badge={
          <>
            {archived && <StateBadge state="archived" />}
            {scan.invented && <InventedMark />}
          </>
        }
        meta={[
          OBSERVABLE_WORDS[scan.observable],
          energySpan(scan.points.map(({ energyKeV }) => energyKeV)),
          off > 0 && `${off} switched off`,
          ...conditionWords(scan),
        ]}
        actions={
          mayEdit && (
            <>
              {!archived && <ButtonLink href={`/scans/${scan.id}/edit`}>Edit</ButtonLink>}
              {archived ? (
                <ActionButton
                  action={restoreScanAction}
                  input={{ id: scan.id }}
                  pendingLabel="Restoring…"
                >
                  Restore
                </ActionButton>
              ) : (
                <ActionButton
                  variant="quiet"
                  action={archiveScanAction}
                  input={{ id: scan.id }}
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
        <Notice kind="information" title="This scan is archived" className="mt-5">
          It is out of the lists; its fits stay as they are.{mayEdit && ' Restore takes it back.'}
        </Notice>
      )}
      <div className="grid gap-x-10 gap-y-8 py-6 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <ScanFigure points={scan.points} observable={scan.observable} title="Energy scan" />
        <section aria-labelledby="points-heading" className="min-w-0">
          <h2 id="points-heading" className="mb-2">
            Points
          </h2>
          <PointsTable points={scan.points} observable={scan.observable} />
          {scan.asymmetryScaleError !== null && (
            <p className="mt-2 text-sm text-ink-2">
              Fractions from asymmetry amplitudes: the maximum asymmetry is known to{' '}
              {asEntered(Number((scan.asymmetryScaleError * 100).toPrecision(3)))} %, which scales
              all points together and is not part of their σ.
            </p>
          )}
        </section>
        <section
          aria-labelledby="fits-heading"
          className="grid min-w-0 content-start gap-4 lg:col-span-2"
        >
          <h2 id="fits-heading">Fits</h2>
          {fits.length > 0 ? (
            <ScanFits fits={fits} />
          ) : (
            <p className="text-sm text-ink-2">No fit of this scan yet.</p>
          )}
          {mayAct(viewer, 'fit') && !archived && (
            <FitThisScan scanId={scan.id} energiesKeV={energiesKeV} sets={sets} />
          )}
        </section>
        <section
          aria-labelledby="origin-heading"
          className="grid min-w-0 content-start gap-2 lg:col-span-2"
        >
          <h2 id="origin-heading">Where it comes from</h2>
          {scan.file ? (
            <KeptFile file={scan.file} />
          ) : (
            <p className="text-sm">The points were typed in; there is no original file.</p>
          )}
          <p className="figures text-xs break-all text-ink-3">
            SHA-256 of the points {scan.pointsSha256}
          </p>
          <p className="text-sm text-ink-2">
            Added by {scan.createdBy}, <Moment at={scan.createdAt} />
          </p>
          {scan.notes !== '' && (
            <p className="mt-2 prose-measure whitespace-pre-wrap">{scan.notes}</p>
          )}
        </section>
      </div>
    </>
  );
}
