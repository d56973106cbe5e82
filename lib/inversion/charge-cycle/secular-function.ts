import type { ChargeCycle } from './charge-cycle';

/** Complex numbers as re, im pairs. */
export interface SecularValues {
  valueRe: number;
  valueIm: number;
  /** ∂f/∂μ; 1/f′ at a root is the amplitude of that mode in the diamagnetic signal. */
  slopeRe: number;
  slopeIm: number;
  /** ∂f/∂Λ_c */
  captureRe: number;
  captureIm: number;
  /** ∂f/∂Λ_i */
  ionisationRe: number;
  ionisationIm: number;
}

/**
 * f(μ) = μ + Λ_c·Σ_j a_j(μ − iΔω_j)/(Λ_i + μ − iΔω_j), whose roots are the eigenvalues of the exchange matrix: the four
 * muonium amplitudes are eliminated, and Σ a_j = 1 is used so that nothing cancels near μ = 0. 1/f(s) is the Laplace
 * transform of the diamagnetic signal.
 */
export function secularFunction(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
  re: number,
  im: number,
): SecularValues {
  let captureRe = 0;
  let captureIm = 0;
  let slopeRe = 0;
  let slopeIm = 0;
  let ionisationRe = 0;
  let ionisationIm = 0;
  for (let j = 0; j < cycle.weights.length; j++) {
    const weight = cycle.weights[j]!;
    // q = 1/(Λ_i + μ − iΔω), t = (μ − iΔω)·q
    const numeratorIm = im - cycle.offsetsPerUs[j]!;
    const denominatorRe = ionisationPerUs + re;
    const square = denominatorRe * denominatorRe + numeratorIm * numeratorIm;
    const qRe = denominatorRe / square;
    const qIm = -numeratorIm / square;
    const tRe = re * qRe - numeratorIm * qIm;
    const tIm = re * qIm + numeratorIm * qRe;
    captureRe += weight * tRe;
    captureIm += weight * tIm;
    slopeRe += weight * (qRe * qRe - qIm * qIm);
    slopeIm += weight * 2 * qRe * qIm;
    ionisationRe -= weight * (tRe * qRe - tIm * qIm);
    ionisationIm -= weight * (tRe * qIm + tIm * qRe);
  }
  const both = capturePerUs * ionisationPerUs;
  return {
    valueRe: re + capturePerUs * captureRe,
    valueIm: im + capturePerUs * captureIm,
    slopeRe: 1 + both * slopeRe,
    slopeIm: both * slopeIm,
    captureRe,
    captureIm,
    ionisationRe: capturePerUs * ionisationRe,
    ionisationIm: capturePerUs * ionisationIm,
  };
}
