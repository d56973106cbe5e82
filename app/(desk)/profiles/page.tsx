import { ProfileList } from '@/components/profile/profile-list';
import { ProfileSearch } from '@/components/profile/profile-search';
import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { listIssuedProfiles } from '@/db/access/profile/list-issued-profiles';
import { read } from '@/app/_server/read';
import type { Metadata } from 'next';

export const metadata: Metadata = { title: 'Issued profiles' };

export default async function ProfilesPage({ searchParams }: PageProps<'/profiles'>) {
  const { q } = await searchParams;
  const words = typeof q === 'string' ? q.trim().slice(0, 200) : '';
  const profiles = await read(listIssuedProfiles, { query: words });
  return (
    <>
      <PageHeader
        title="Issued profiles"
        meta={['accepted by a reviewer, numbered, never changed afterwards']}
      />
      {(profiles.length > 0 || words !== '') && <ProfileSearch words={words} />}
      {profiles.length > 0 && <ProfileList profiles={profiles} />}
      {profiles.length === 0 && words !== '' && (
        <EmptyState
          title={`No issued profile has “${words}” in its number, sample, material, scan or fit.`}
          action={<ButtonLink href="/profiles">Show all</ButtonLink>}
        />
      )}
      {profiles.length === 0 && words === '' && (
        <EmptyState
          title="No profile is issued yet."
          text="A fit that a reviewer accepts becomes an issued profile, with a number to cite and a CSV to export."
          action={<ButtonLink href="/reviews">Go to the reviews</ButtonLink>}
        />
      )}
    </>
  );
}
