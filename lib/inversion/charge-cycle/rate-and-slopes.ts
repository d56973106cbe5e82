/** Decay rate of the diamagnetic line (µs⁻¹, without λ₀) and its derivatives by Λ_c and Λ_i (both dimensionless). */
export interface RateAndSlopes {
  ratePerUs: number;
  byCapture: number;
  byIonisation: number;
}
