import type { ChargeCycle } from './charge-cycle';
import type { RateAndSlopes } from './rate-and-slopes';

/**
 * Share of its phase that the muon loses in one neutral spell, Σ_j a_j Δω_j²/(Δω_j² + Λ_i²): 1 where ionisation is slow,
 * falling as Λ_i⁻² where it is fast (averaging over exponentially distributed spells, each line dephasing by Δω_j).
 */
export function dephasedShare(cycle: ChargeCycle, ionisationPerUs: number): number {
  const square = ionisationPerUs * ionisationPerUs;
  let sum = 0;
  for (let j = 0; j < cycle.weights.length; j++) {
    const offset = cycle.offsetsPerUs[j]! * cycle.offsetsPerUs[j]!;
    sum += (cycle.weights[j]! * offset) / (offset + square);
  }
  return sum;
}

/**
 * Decay rate of the diamagnetic line without its background, Λ_c·Σ_j a_j Δω_j²/(Δω_j² + Λ_i²), µs⁻¹, in the limit
 * Λ_c ≪ Λ_i, Δω_j (first order of the exchange matrix in Λ_c; closedFormHolds says where). Rates µs⁻¹; Λ_i > 0.
 */
export function closedFormRate(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
): RateAndSlopes {
  const square = ionisationPerUs * ionisationPerUs;
  let share = 0;
  let slope = 0;
  for (let j = 0; j < cycle.weights.length; j++) {
    const offset = cycle.offsetsPerUs[j]! * cycle.offsetsPerUs[j]!;
    const term = (cycle.weights[j]! * offset) / (offset + square);
    share += term;
    slope -= (2 * ionisationPerUs * term) / (offset + square);
  }
  return {
    ratePerUs: capturePerUs * share,
    byCapture: share,
    byIonisation: capturePerUs * slope,
  };
}
