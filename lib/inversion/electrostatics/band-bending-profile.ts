import { InversionError } from '../errors';
import { type BandBendingInput, reducedPotentials } from './band-bending-input';
import { BOLTZMANN_EV_PER_K } from './constants';
import { reducedCurve } from './reduced-curve';
import { debyeLengthOf, surfaceCharge, type SurfaceCharge } from './surface-charge';

/** Depths are nm below the semiconductor surface; a depth that is negative or not a number throws. */
export interface BandBendingProfile extends SurfaceCharge {
  /** L_D of the majority carriers of the bulk. */
  debyeLengthNm: number;
  /** φ(x), eV, with the sign of φ_s. */
  bandBendingEvAt(depthNm: number): number;
  /** N·e^(−φ/kT), cm⁻³. */
  majorityPerCm3At(depthNm: number): number;
  /** N·e^((φ − 2φ_F)/kT), cm⁻³. */
  minorityPerCm3At(depthNm: number): number;
  /** Mean of the majority carriers from left to right, cm⁻³: the exact integral of the profile, not its middle value. */
  meanMajorityPerCm3(leftNm: number, rightNm: number): number;
}

/**
 * Band bending below a surface from Poisson's equation with Boltzmann statistics and both carriers,
 * φ″ = (q/ε)[N(1 − e^(−φ/kT)) + n₀(e^(φ/kT) − 1)], φ(0) = φ_s, φ(∞) = 0 (Kingston and Neustadter, J. Appl. Phys. 26, 718
 * (1955)). N is the majority concentration of the bulk; where n_i is not small beside the doping it exceeds the doping
 * (bulkCarriers). The first integral is exact, the depth follows by quadrature and is inverted by quintic pieces: φ is good
 * to 1e-9 of itself and means over bins to 1e-8, from strong inversion to the tail (measured against two independent
 * integrations of the second-order equation). Every φ_s of one bulk is the same curve, shifted in depth.
 *
 * Not meant for a degenerate surface, where the carriers exceed the density of states, nor for quantisation in an
 * inversion layer.
 *
 * @throws InversionError for what reducedPotentials refuses.
 */
export function bandBendingProfile(input: BandBendingInput): BandBendingProfile {
  const { surface, fermi } = reducedPotentials(input);
  const length = debyeLengthOf(input);
  const kT = BOLTZMANN_EV_PER_K * input.temperatureK;
  const curve = reducedCurve(surface, fermi);
  const potentialAt = (depthNm: number): number => curve.potential(checkedDepth(depthNm) / length);
  const shareTo = (depthNm: number): number => curve.share(checkedDepth(depthNm) / length) * length;
  return {
    debyeLengthNm: length,
    ...surfaceCharge(input),
    bandBendingEvAt: (depthNm) => kT * potentialAt(depthNm),
    majorityPerCm3At: (depthNm) => input.bulkPerCm3 * Math.exp(-potentialAt(depthNm)),
    minorityPerCm3At: (depthNm) => input.bulkPerCm3 * Math.exp(potentialAt(depthNm) - 2 * fermi),
    meanMajorityPerCm3: (leftNm, rightNm) => {
      if (!(rightNm > leftNm)) {
        throw new InversionError(
          'bad-depth',
          `A bin cannot run from ${leftNm} nm to ${rightNm} nm.`,
        );
      }
      return (input.bulkPerCm3 * (shareTo(rightNm) - shareTo(leftNm))) / (rightNm - leftNm);
    },
  };
}

function checkedDepth(depthNm: number): number {
  if (depthNm >= 0 && Number.isFinite(depthNm)) return depthNm;
  throw new InversionError('bad-depth', `A depth below the surface cannot be ${depthNm} nm.`);
}
