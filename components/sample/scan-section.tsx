import { ButtonLink } from '@/components/ui/button-link';
import { EmptyState } from '@/components/ui/empty-state';
import { InventedMark } from '@/components/ui/invented-mark';
import { Section } from '@/components/ui/section';
import type { Sample } from '@/lib/schemas/sample';
import type { Scan } from '@/lib/schemas/scan';

import { allInvented } from './all-invented';
import { ScanTable } from './scan-table';

type ScanSectionProps = {
  sample: Sample;
  scans: readonly Scan[];
  archivedScans: readonly Scan[];
  mayAdd: boolean;
  mayFit: boolean;
};

/** The energy scans of a sample; archived ones stay within reach, folded away. */
export function ScanSection({ sample, scans, archivedScans, mayAdd, mayFit }: ScanSectionProps) {
  return (
    <Section title="Energy scans" badge={allInvented(scans) && <InventedMark />}>
      {scans.length > 0 ? (
        <ScanTable caption={`Energy scans of ${sample.name}`} scans={scans} mayFit={mayFit} />
      ) : (
        <EmptyState
          title="No energy scan yet."
          text={<p>A scan is a file, or typed points, with energy, value and uncertainty.</p>}
          action={
            mayAdd && (
              <ButtonLink href={`/scans/new?sample=${sample.id}`}>Add an energy scan</ButtonLink>
            )
          }
        />
      )}
      {archivedScans.length > 0 && (
        <details>
          <summary className="text-sm text-ink-2">
            {archivedScans.length} archived {archivedScans.length === 1 ? 'scan' : 'scans'}
          </summary>
          <ScanTable caption="Archived energy scans" scans={archivedScans} mayFit={false} />
        </details>
      )}
    </Section>
  );
}
