import { group } from 'd3';

import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { StateBadge } from '@/components/ui/state-badge';
import { TextLink } from '@/components/ui/text-link';
import type { FitRow } from '@/lib/schemas/fit';

import { compareAddress, MOST_FITS } from './compare-address';

interface ChooseFitsProps {
  /** All fits that the viewer may see. */
  fits: readonly FitRow[];
  /** The one fit that the address already names. */
  chosenId: string | null;
  /** Without a page header, below a notice. */
  bare?: boolean;
}

/** Nothing to compare yet: with one fit named, the others of its scan; with none, every scan that has two. */
export function ChooseFits({ fits, chosenId, bare = false }: ChooseFitsProps) {
  const chosen = fits.find((fit) => fit.id === chosenId) ?? null;
  return (
    <>
      {!bare && <PageHeader title="Compare" breadcrumb={[{ label: 'Fits', href: '/fits' }]} />}
      {chosen ? <BesideOne chosen={chosen} fits={fits} /> : <ByScan fits={fits} />}
    </>
  );
}

function BesideOne({ chosen, fits }: { chosen: FitRow; fits: readonly FitRow[] }) {
  const others = fits.filter((fit) => fit.scanId === chosen.scanId && fit.id !== chosen.id);
  if (others.length === 0) {
    return (
      <EmptyState
        title={`“${chosen.name}” is the only fit of this scan.`}
        text="Make another one, for example with a sharp edge where this one is graded, and compare the two."
        action={<ButtonLink href={`/fits/new?from=${chosen.id}`}>Make another fit</ButtonLink>}
      />
    );
  }
  return (
    <section aria-labelledby="beside" className="grid gap-3 pt-6">
      <h2 id="beside">Compare “{chosen.name}” with</h2>
      <ul className="grid prose-measure border-t border-rule">
        {others.map((fit) => (
          <li
            key={fit.id}
            className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-rule py-2"
          >
            <TextLink href={compareAddress([chosen.id, fit.id])} className="font-medium">
              {fit.name}
            </TextLink>
            <StateBadge state={fit.state} />
            <span className="text-[0.8125rem] text-ink-3">
              {fit.profile} edge, {fit.createdBy}
            </span>
          </li>
        ))}
      </ul>
      {others.length > 1 && (
        <p>
          <ButtonLink
            href={compareAddress([chosen, ...others].slice(0, MOST_FITS).map((fit) => fit.id))}
          >
            Compare with all of them
          </ButtonLink>
        </p>
      )}
    </section>
  );
}

function ByScan({ fits }: { fits: readonly FitRow[] }) {
  const groups = [...group(fits, (fit) => fit.scanId).values()].filter(
    (ofScan) => ofScan.length > 1,
  );
  if (groups.length === 0) {
    return (
      <EmptyState
        title="No scan has two fits yet."
        text="Save a sharp and a graded fit of one scan; then they can be put over each other here."
        action={<ButtonLink href="/fits">Go to the fits</ButtonLink>}
      />
    );
  }
  return (
    <section aria-labelledby="by-scan" className="grid gap-3 pt-6">
      <h2 id="by-scan">Scans with two fits or more</h2>
      <ul className="grid prose-measure border-t border-rule">
        {groups.map((ofScan) => {
          const [first] = ofScan;
          if (!first) return null;
          const ids = ofScan.slice(0, MOST_FITS).map((fit) => fit.id);
          return (
            <li key={first.scanId} className="border-b border-rule py-2">
              <TextLink href={compareAddress(ids)} className="font-medium">
                {first.sampleName}, {first.scanName}
              </TextLink>
              <span className="ml-2 text-[0.8125rem] text-ink-3">
                {ids.length === ofScan.length
                  ? ids.length
                  : `first ${ids.length} of ${ofScan.length}`}{' '}
                fits:{' '}
                {ofScan
                  .slice(0, MOST_FITS)
                  .map((fit) => fit.name)
                  .join(', ')}
              </span>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
