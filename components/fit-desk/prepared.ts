import {
  foldCurve,
  foldScan,
  InversionError,
  prepareFit,
  type FitInput,
  type ParameterValues,
  type PreparedFit,
} from '@/lib/inversion/index';
import type { ScanCurve } from '@/components/charts/chart-types';

export type PreparedOrRefusal =
  { ok: true; prepared: PreparedFit } | { ok: false; message: string };

/** Prepares an input on this thread, for drawing; a wrong input answers its sentence. */
export function prepareToDraw(input: FitInput): PreparedOrRefusal {
  try {
    return { ok: true, prepared: prepareFit(input) };
  } catch (error) {
    if (error instanceof InversionError) return { ok: false, message: error.message };
    throw error;
  }
}

const CURVE_POINTS = 60;

/** Energies of a smooth curve: over the points of the scan, as far as the stopping set goes. */
export function curveEnergies({
  points,
  stopping,
}: Pick<FitInput, 'points' | 'stopping'>): Float64Array {
  const energies = points.map((point) => point.energyKeV);
  const ladder = stopping.profiles.map((profile) => profile.energyKeV);
  const low = Math.max(Math.min(...energies), Math.min(...ladder));
  const high = Math.min(Math.max(...energies), Math.max(...ladder));
  return Float64Array.from({ length: CURVE_POINTS }, (_, i) =>
    i === CURVE_POINTS - 1 ? high : low + ((high - low) * i) / (CURVE_POINTS - 1),
  );
}

/** The folded curve of given values, ready to draw. */
export function foldedCurve(
  prepared: PreparedFit,
  values: ParameterValues,
  energiesKeV: Float64Array,
  look: Pick<ScanCurve, 'label' | 'style' | 'colour'>,
): ScanCurve {
  return { ...look, energiesKeV, values: foldCurve(prepared, values, energiesKeV) };
}

export function predictedAtPoints(prepared: PreparedFit, values: ParameterValues): Float64Array {
  return foldScan(prepared, values);
}
