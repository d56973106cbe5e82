import type { Ridge } from '@/components/charts/chart-types';
import { thinRidge } from '@/components/review/thin-ridge';
import {
  InversionError,
  stoppingProfileAt,
  type ScanPoint,
  type StoppingSet,
} from '@/lib/inversion/index';

const MOST_BINS = 400;

/** Stopping profiles of the energies of a scan, thinned for drawing; energies outside the set have none. */
export function ridgesOf(
  points: readonly Pick<ScanPoint, 'energyKeV'>[],
  stopping: StoppingSet,
): Ridge[] {
  return points.flatMap(({ energyKeV }) => {
    try {
      const profile = stoppingProfileAt(stopping, energyKeV);
      return [
        thinRidge(
          { ...profile, energyKeV, interpolated: profile.interpolatedBetween !== null },
          MOST_BINS,
        ),
      ];
    } catch (error) {
      if (error instanceof InversionError) return [];
      throw error;
    }
  });
}
