import { ChooseFits } from '@/components/compare/choose-fits';
import { CompareView } from '@/components/compare/compare-view';
import { idsInAddress } from '@/components/compare/compare-address';
import { savedCurve } from '@/components/review/saved-fit-figures';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { compareFits } from '@/db/access/fit/compare-fits';
import { listFits } from '@/db/access/fit/list-fits';
import { readSample } from '@/db/access/sample/read-sample';
import { readStoppingSet } from '@/db/access/stopping-set/read-stopping-set';
import { AppError } from '@/lib/errors';
import type { Fit } from '@/lib/schemas/fit';
import { read } from '@/app/_server/read';
import type { Metadata } from 'next';

export const metadata: Metadata = { title: 'Compare' };

export default async function ComparePage({ searchParams }: PageProps<'/compare'>) {
  const ids = idsInAddress((await searchParams).fits);
  if (ids.length < 2)
    return <ChooseFits fits={await read(listFits, {})} chosenId={ids[0] ?? null} />;
  const compared = await fitsOrRefusal(ids);
  if ('refusal' in compared) {
    return (
      <>
        <PageHeader title="Compare" breadcrumb={[{ label: 'Fits', href: '/fits' }]} />
        <Notice kind="problem" className="mt-6" title="These fits cannot be compared">
          {compared.refusal}
        </Notice>
        <ChooseFits fits={await read(listFits, {})} chosenId={null} bare />
      </>
    );
  }
  const { fits } = compared;
  const [first] = fits;
  const [others, sample, curves] = await Promise.all([
    read(listFits, { scanId: first.scanId }),
    read(readSample, { id: first.sampleId }),
    Promise.all(
      fits.map(async (fit) =>
        savedCurve(fit, await read(readStoppingSet, { id: fit.stoppingSetId })),
      ),
    ),
  ]);
  return (
    <CompareView
      fits={fits}
      curves={curves}
      carrier={sample.carrier}
      others={others.filter((other) => !ids.includes(other.id))}
    />
  );
}

/** A refusal of the verb is something to read on the page, not a failure of it. */
async function fitsOrRefusal(
  ids: string[],
): Promise<{ fits: [Fit, ...Fit[]] } | { refusal: string }> {
  try {
    const [first, ...rest] = await read(compareFits, { ids });
    return first ? { fits: [first, ...rest] } : { refusal: 'There is no such fit.' };
  } catch (error) {
    if (error instanceof AppError) return { refusal: error.message };
    throw error;
  }
}
