import { ELEMENTARY_CHARGE_C, NM_PER_CM, VACUUM_PERMITTIVITY_F_PER_CM } from './constants';
import { checkEstimate, DOPING, PERMITTIVITY, powerLaw, type Estimate } from './estimate';

export interface EdgeElectrostaticsInput {
  /** W: depth of the edge below the semiconductor surface, nm. */
  edgeDepthNm: Estimate;
  /** N: net ionised doping, cm⁻³, known from elsewhere. */
  dopingPerCm3: Estimate;
  relativePermittivity: Estimate;
}

/** Boundary condition at the surface that reproduces an edge; magnitudes, the signs follow from the carrier type. */
export interface EdgeElectrostatics {
  /** φ_s = q N W²/(2ε), eV. */
  bandBendingEv: Estimate;
  /** Q/q = N·W, cm⁻²: elementary charges at the surface that balance the depleted doping. */
  sheetChargePerCm2: Estimate;
  /** E_s = q N W/ε, V/cm. */
  surfaceFieldVPerCm: Estimate;
}

/**
 * Surface state of a fully depleted layer of width W in doping N (abrupt approximation, Sze, section 2.2.1). The three
 * come from the same W and N, so their uncertainties go together. σ to first order with W, N and ε_r independent of each
 * other: right when N comes from elsewhere (a Hall or capacitance measurement), too small or too large when N was fitted
 * together with W.
 *
 * @throws InversionError for anything that is not a positive number.
 */
export function edgeElectrostatics(input: EdgeElectrostaticsInput): EdgeElectrostatics {
  const { edgeDepthNm: w, dopingPerCm3: n, relativePermittivity: epsilon } = input;
  checkEstimate(w, { name: 'edge depth', unit: 'nm' });
  checkEstimate(n, DOPING);
  checkEstimate(epsilon, PERMITTIVITY);
  const fieldPerCm = ELEMENTARY_CHARGE_C / VACUUM_PERMITTIVITY_F_PER_CM / NM_PER_CM;
  return {
    bandBendingEv: powerLaw(fieldPerCm / (2 * NM_PER_CM), [
      [n, 1],
      [w, 2],
      [epsilon, -1],
    ]),
    sheetChargePerCm2: powerLaw(1 / NM_PER_CM, [
      [n, 1],
      [w, 1],
    ]),
    surfaceFieldVPerCm: powerLaw(fieldPerCm, [
      [n, 1],
      [w, 1],
      [epsilon, -1],
    ]),
  };
}
