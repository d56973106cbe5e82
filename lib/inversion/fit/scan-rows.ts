import { InversionError } from '../errors';
import { correlatedWhitener, diagonalWhitener, whiten, type Whitener } from '../linalg/whitener';
import { stoppingProfileAt } from '../stopping/stopping-profile-at';
import type { FitInput, ScanPoint, StoppingProfile, StoppingSet } from '../types';

/** Stopping profile of a point; null for a switched-off point outside the stopping set. */
export function profileOf(
  stopping: StoppingSet,
  { energyKeV, enabled }: ScanPoint,
): StoppingProfile | null {
  try {
    return stoppingProfileAt(stopping, energyKeV);
  } catch (error) {
    if (!enabled && error instanceof InversionError && error.code === 'energy-outside-stopping-set')
      return null;
    throw error;
  }
}

/** Points that have a stopping profile, in ascending energy: the order of a scan then changes nothing, to the last bit. */
export function rowsByEnergy(
  points: readonly ScanPoint[],
  profiles: readonly (StoppingProfile | null)[],
): Int32Array {
  const used = points.map((_, index) => index).filter((index) => profiles[index] !== null);
  return Int32Array.from(used.sort((a, b) => points[a]!.energyKeV - points[b]!.energyKeV));
}

/** W of the rows of the model, which are not in the order of the points. */
export function whitenerOf(
  { points, covariance }: Pick<FitInput, 'points' | 'covariance'>,
  rows: ArrayLike<number>,
): Whitener {
  const order = Array.from(rows);
  const enabled = order.map((index) => points[index]!.enabled);
  return covariance
    ? correlatedWhitener(
        order.map((a) => order.map((b) => covariance[a]![b]!)),
        enabled,
      )
    : diagonalWhitener(
        order.map((index) => points[index]!.sigma),
        enabled,
      );
}

/** W·y, in the rows of the model. */
export function whitenedValues(
  { points }: Pick<FitInput, 'points'>,
  pointOfRow: Int32Array,
  whitener: Whitener,
): Float64Array {
  const target = Float64Array.from(pointOfRow, (index) => points[index]!.value);
  whiten(whitener, target);
  return target;
}
