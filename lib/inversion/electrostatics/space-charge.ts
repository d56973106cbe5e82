/**
 * Space charge of a semiconductor in equilibrium, in reduced units: v = φ/kT is the band bending in the direction that
 * depletes the majority carriers (down in p-type, up in n-type), depth is in Debye lengths of the majority carriers and
 * u_F = φ_F/kT, so that minority/majority in the bulk is r = e^(−2u_F); u_F = ∞ leaves the minority carriers out.
 * n-type is p-type with the sign of the charge turned round.
 */

/** Terms of the series of e^(−v) + v − 1 that are needed below |v| = 0.5 for the last digit. */
const SERIES_BELOW = 0.5;

/** e^(−v) + v − 1 ≥ 0 without cancellation near 0. */
export function majorityTerm(v: number): number {
  if (Math.abs(v) > SERIES_BELOW) return Math.expm1(-v) + v;
  let term = (v * v) / 2;
  let sum = term;
  for (let k = 3; Math.abs(term) > 1e-18 * sum; k++) {
    term *= -v / k;
    sum += term;
  }
  return sum;
}

/** r·(e^v − v − 1) ≥ 0, with r e^v kept as one exponential: r alone underflows in a wide gap. */
export function minorityTerm(v: number, fermiReduced: number): number {
  const ratio = Math.exp(-2 * fermiReduced);
  if (v < SERIES_BELOW) return ratio * majorityTerm(-v);
  return Math.exp(v - 2 * fermiReduced) - ratio * (v + 1);
}

/**
 * Space-charge function F(v) = √[(e^(−v) + v − 1) + r(e^v − v − 1)] ≥ 0: the field at band bending v is
 * (√2 kT/(q L_D))·F. Limits: |v|·√((1 + r)/2) at flat band, √(v − 1) in depletion, √r·e^(v/2) in strong inversion
 * (v > 2u_F), e^(|v|/2) in accumulation. The same as the cosh and sinh form of Kingston and Neustadter, J. Appl. Phys. 26,
 * 718 (1955), equation 8: L_D here is that of the majority carriers, not the intrinsic one (Sze, section 4.2.1, equation 11).
 */
export function spaceChargeFunction(v: number, fermiReduced: number): number {
  return Math.sqrt(majorityTerm(v) + minorityTerm(v, fermiReduced));
}

/** Net charge over q·majority: v″ = (1 − e^(−v)) + r(e^v − 1), Poisson's equation in reduced units. */
export function reducedCharge(v: number, fermiReduced: number): number {
  const minority =
    v < SERIES_BELOW
      ? Math.exp(-2 * fermiReduced) * Math.expm1(v)
      : Math.exp(v - 2 * fermiReduced) - Math.exp(-2 * fermiReduced);
  return minority - Math.expm1(-v);
}
