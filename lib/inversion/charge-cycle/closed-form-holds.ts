import type { ChargeCycle } from './charge-cycle';

/** Largest error of the closed form that the product accepts, relative to the rate. */
export const CLOSED_FORM_TOLERANCE = 1e-3;

/**
 * Estimated error of closedFormRate, relative to the rate: the next order of the exchange matrix in Λ_c. With
 * S(μ) = Σ a_j(μ − iΔω_j)/(Λ_i + μ − iΔω_j) and μ = −Λ_c·S(μ), μ = −Λ_c S + Λ_c² S S′ + …, all at μ = 0, so the error is
 * Λ_c|Re(S S′)|/Re S; the order after it, about Λ_c²|S|(|S′|² + |S S″|/2)/Re S, is added so that an accidental zero does not count.
 */
export function closedFormError(
  { weights, offsetsPerUs }: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
): number {
  let sRe = 0;
  let sIm = 0;
  let dRe = 0;
  let dIm = 0;
  let curvature = 0;
  for (let j = 0; j < weights.length; j++) {
    const offset = offsetsPerUs[j]!;
    const square = ionisationPerUs * ionisationPerUs + offset * offset;
    const qRe = ionisationPerUs / square;
    const qIm = offset / square;
    sRe += weights[j]! * offset * qIm;
    sIm -= weights[j]! * offset * qRe;
    dRe += weights[j]! * ionisationPerUs * (qRe * qRe - qIm * qIm);
    dIm += weights[j]! * ionisationPerUs * 2 * qRe * qIm;
    curvature += (weights[j]! * 2 * ionisationPerUs) / (square * Math.sqrt(square));
  }
  const size = Math.hypot(sRe, sIm);
  const second = Math.abs(sRe * dRe - sIm * dIm);
  const third = size * (dRe * dRe + dIm * dIm + (size * curvature) / 2);
  return (capturePerUs * (second + capturePerUs * third)) / sRe;
}

/**
 * Whether the product may use the closed form: its estimated error is at most 0.1 % of the rate. Beyond that it uses the
 * exchange matrix. One fit uses one of the two throughout, so that χ² has no steps.
 */
export function closedFormHolds(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
): boolean {
  return closedFormError(cycle, capturePerUs, ionisationPerUs) <= CLOSED_FORM_TOLERANCE;
}
