import { AppError } from '@/lib/errors';
import type { FitInput, ScanPoint, StoppingSet } from '@/lib/inversion/index';
import type { FitSpec } from '@/lib/schemas/fit';
import type { TypedPoint } from '@/lib/schemas/scan';

const SAME_ENERGY = 1e-9;

/** The points of a scan as a fit sees them: those switched off for it stay, marked. */
export function frozenPoints(
  points: readonly TypedPoint[],
  switchedOffKeV: readonly number[],
): ScanPoint[] {
  const isAt = (energyKeV: number) => (other: number) =>
    Math.abs(other - energyKeV) <= SAME_ENERGY * energyKeV;
  for (const energyKeV of switchedOffKeV) {
    if (!points.some((point) => isAt(point.energyKeV)(energyKeV)))
      throw new AppError('invalid', `The fit switches ${energyKeV} keV off, which the scan lacks.`);
  }
  return points.map(({ energyKeV, value, sigma, enabled }) => ({
    energyKeV,
    value,
    sigma,
    enabled: enabled && !switchedOffKeV.some(isAt(energyKeV)),
  }));
}

/** Everything that the answer depends on, from what is stored. */
export function fitInputOf(frozen: {
  observable: FitInput['observable'];
  points: readonly ScanPoint[];
  spec: FitSpec;
  stopping: StoppingSet;
}): FitInput {
  const { observable, points, spec, stopping } = frozen;
  return {
    observable,
    points,
    stopping,
    profile: spec.profile,
    polarity: spec.polarity,
    response: spec.response,
    carriers: spec.carriers,
    capThicknessNm: spec.capThicknessNm,
    parameters: spec.parameters,
  };
}
