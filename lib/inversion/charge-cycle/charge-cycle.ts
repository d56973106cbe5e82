import { breitRabiLines, diamagneticMHz } from './muonium-lines';

/** What the neutral state does to a muon while it is neutral: four lines, as the rates below need them. */
export interface ChargeCycle {
  /** a_j */
  weights: Float64Array;
  /** Δω_j: angular offsets from the diamagnetic line, rad/µs. */
  offsetsPerUs: Float64Array;
}

/**
 * Four-line charge cycle in a transverse field: Δω_j = 2π(ν_j − ν_diamagnetic).
 *
 * @throws InversionError for a hyperfine constant that is not positive or a negative field.
 */
export function chargeCycle(hyperfineMHz: number, fieldMt: number): ChargeCycle {
  const lines = breitRabiLines(hyperfineMHz, fieldMt);
  const origin = diamagneticMHz(fieldMt);
  return {
    weights: Float64Array.from(lines, ({ weight }) => weight),
    offsetsPerUs: Float64Array.from(
      lines,
      ({ frequencyMHz }) => 2 * Math.PI * (frequencyMHz - origin),
    ),
  };
}

/** √(Σ a_j Δω_j²): the ionisation rate about which the relaxation gives way, rad/µs. */
export function meanOffsetPerUs({ weights, offsetsPerUs }: ChargeCycle): number {
  return Math.sqrt(offsetsPerUs.reduce((sum, offset, j) => sum + weights[j]! * offset * offset, 0));
}
