import { exportChoiceOf } from '@/components/profile/export-choice';
import { ProfileView } from '@/components/profile/profile-view';
import { savedFitFigures } from '@/components/review/saved-fit-figures';
import { readIssuedProfile } from '@/db/access/profile/read-issued-profile';
import { MAX_EXPORT_ROWS } from '@/db/access/profile/uniform-profile';
import { readSample } from '@/db/access/sample/read-sample';
import { readScan } from '@/db/access/scan/read-scan';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';
import { read } from '@/app/_server/read';
import type { Metadata } from 'next';

export async function generateMetadata({
  params,
}: PageProps<'/profiles/[profileId]'>): Promise<Metadata> {
  const profile = await read(readIssuedProfile, { id: (await params).profileId });
  return { title: `${profile.number}, ${profile.sampleName}` };
}

export default async function ProfilePage({
  params,
  searchParams,
}: PageProps<'/profiles/[profileId]'>) {
  const profile = await read(readIssuedProfile, { id: (await params).profileId });
  const { fit } = profile;
  const [sample, scan, stoppingSet] = await Promise.all([
    read(readSample, { id: fit.sampleId }),
    read(readScan, { id: fit.scanId }),
    read(readStoppingSet, { id: fit.stoppingSetId }),
  ]);
  return (
    <ProfileView
      profile={profile}
      figures={savedFitFigures(fit, stoppingSet)}
      carrier={sample.carrier}
      scanFile={scan.file}
      stoppingFiles={stoppingSet.files}
      choice={exportChoiceOf(await searchParams)}
      maxRows={MAX_EXPORT_ROWS}
    />
  );
}
