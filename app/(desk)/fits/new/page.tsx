import type { Metadata } from 'next';

import { read } from '@/app/_server/read';
import { ScanPicker } from '@/components/fit-desk/scan-picker';
import { FitDesk } from '@/components/fit-desk/fit-desk';
import { usualAssumptions } from '@/components/fit-desk/usual-assumptions';
import { readFit } from '@/db/access/fit/read-fit';
import { mayAct } from '@/db/access/policy';
import { readSample } from '@/db/access/sample/read-sample';
import { listScans } from '@/db/access/scan/list-scans';
import { readScan } from '@/db/access/scan/read-scan';
import { listStoppingSets } from '@/db/access/stopping-set/list-stopping-sets';

import { readViewer } from '../../read-viewer';

export const metadata: Metadata = { title: 'New fit' };

export default async function NewFitPage({ searchParams }: PageProps<'/fits/new'>) {
  const query = await searchParams;
  const from = typeof query.from === 'string' ? query.from : null;
  const parent = from === null ? null : await read(readFit, { id: from });
  const scanId = parent?.scanId ?? (typeof query.scan === 'string' ? query.scan : null);
  if (scanId === null) return <ScanPicker scans={await read(listScans)} />;

  const [viewer, scan, stoppingSets] = await Promise.all([
    readViewer(),
    read(readScan, { id: scanId }),
    read(listStoppingSets),
  ]);
  const sample = await read(readSample, { id: scan.sampleId });
  return (
    <FitDesk
      // Another scan or parent is another desk: nothing of the last one stays.
      key={`${scan.id} ${parent?.id ?? ''}`}
      scan={scan}
      sample={sample}
      stoppingSets={stoppingSets}
      usual={usualAssumptions(scan, sample, stoppingSets, parent)}
      parent={
        parent && { id: parent.id, name: parent.name, scanChangedSince: parent.scanChangedSince }
      }
      maySave={mayAct(viewer, 'fit')}
    />
  );
}
