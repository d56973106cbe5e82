import { group } from 'd3';

import { TextLink } from '@/components/ui/text-link';
import type { FitRow } from '@/lib/schemas/fit';

/** As many as the compare page lays over each other. */
const MOST = 8;

/** One link for each scan that has two fits or more. */
export function CompareLinks({ fits }: { fits: readonly FitRow[] }) {
  const byScan = [...group(fits, (fit) => fit.scanId)];
  return byScan
    .filter(([, ofScan]) => ofScan.length > 1)
    .map(([scanId, ofScan]) => (
      <TextLink key={scanId} href={`/compare?fits=${idsOf(ofScan)}`}>
        Compare the fits of {ofScan[0]?.scanName}
      </TextLink>
    ));
}

function idsOf(fits: readonly FitRow[]): string {
  return fits
    .slice(0, MOST)
    .map((fit) => fit.id)
    .join(',');
}
