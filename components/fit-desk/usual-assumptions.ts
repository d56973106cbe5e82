import type { Fit } from '@/lib/schemas/fit';
import type { Sample } from '@/lib/schemas/sample';
import type { Scan } from '@/lib/schemas/scan';
import type { StoppingSetRow } from '@/lib/schemas/stopping-set';

import { defaultAssumptions, type Assumptions } from './assumptions';
import { uncoveredEnergies } from './fit-input';

/** What the desk opens with: the settings of the fit it comes from, else what scan and sample give. */
export function usualAssumptions(
  scan: Scan,
  sample: Sample,
  sets: readonly StoppingSetRow[],
  parent: Fit | null,
): Assumptions {
  if (parent) {
    const still = sets.some(({ id }) => id === parent.stoppingSetId);
    return {
      ...parent.spec,
      stoppingSetId: still ? parent.stoppingSetId : firstCovering(scan, sets),
    };
  }
  return defaultAssumptions(scan, sample, firstCovering(scan, sets));
}

/** The newest stopping set that covers every energy in use; none when all miss some. */
function firstCovering(scan: Scan, sets: readonly StoppingSetRow[]): string | null {
  const newestFirst = [...sets].sort((a, b) => b.createdAt.localeCompare(a.createdAt));
  return (
    newestFirst.find(
      (set) =>
        set.energiesKeV.length > 0 && uncoveredEnergies(scan.points, set.energiesKeV).length === 0,
    )?.id ?? null
  );
}
