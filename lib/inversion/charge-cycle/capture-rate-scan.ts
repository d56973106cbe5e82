import type { ScanPoint } from '../types';
import type { JointFitAnswer } from './joint-fit-answer';

/** A capture-rate scan with the covariance of its points, ready to be the data of a profile fit. */
export interface CaptureRateScan {
  points: ScanPoint[];
  /** V: covariance of the points, µs⁻², in their order. */
  covariance: number[][];
}

export type CaptureRateScanOutcome =
  { ok: true; scan: CaptureRateScan } | { ok: false; reason: string };

/**
 * Λ_c(E) of a joint fit as an energy scan in ascending energy, with its full covariance: the points share ν, E_A and λ₀ and
 * are correlated. The covariance has those integrated out (it is the block of the whole covariance, not its inverse's).
 */
export function captureRateScan({
  parameters,
  covariance,
}: JointFitAnswer): CaptureRateScanOutcome {
  if (!covariance.ok) return { ok: false, reason: covariance.reason };
  const rates = parameters
    .map((parameter, k) => ({ ...parameter, place: covariance.indices.indexOf(k) }))
    .filter(({ name }) => name === 'capturePerUs')
    .sort((one, other) => one.energyKeV! - other.energyKeV!);
  const blind = rates.find(({ place }) => place < 0);
  if (blind) {
    return {
      ok: false,
      reason: `No point says anything of the capture rate at ${blind.energyKeV} keV.`,
    };
  }
  const block = rates.map(({ place: a }) => rates.map(({ place: b }) => covariance.matrix[a]![b]!));
  return {
    ok: true,
    scan: {
      points: rates.map(({ energyKeV, value }, k) => ({
        energyKeV: energyKeV!,
        value,
        sigma: Math.sqrt(block[k]![k]!),
        enabled: true,
      })),
      covariance: block,
    },
  };
}
