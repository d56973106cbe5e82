import { InversionError } from '../errors';
import { type BandBendingInput, reducedPotentials } from './band-bending-input';
import { BOLTZMANN_EV_PER_K } from './constants';
import { potentialTable, TAIL_BELOW, type PotentialTable } from './potential-table';
import { quinticHermite } from './quintic-hermite';
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

interface ReducedCurve {
  /** v at depth ξ. */
  potential(depth: number): number;
  /** ∫₀^ξ e^(−v) dξ. */
  share(depth: number): number;
}

function reducedCurve(surface: number, fermi: number): ReducedCurve {
  const decay = Math.sqrt(1 + Math.exp(-2 * fermi));
  if (Math.abs(surface) <= TAIL_BELOW) return tail(surface, decay, 0, 0);
  const table = potentialTable(surface, fermi);
  const last = table.nodeCount - 1;
  const sign = Math.sign(surface);
  const end = table.depth[last]!;
  const beyond = tail(sign * Math.exp(table.log[last]!), decay, end, table.share[last]!);
  return {
    potential: (depth) =>
      depth >= end ? beyond.potential(depth) : sign * Math.exp(interpolate(table, depth, 'log')),
    share: (depth) => (depth >= end ? beyond.share(depth) : interpolate(table, depth, 'share')),
  };
}

/** v = v₀·e^(−√(1 + r)(ξ − ξ₀)) where |v| is small, and m = m₀ + (ξ − ξ₀) − ∫v. */
function tail(v0: number, decay: number, from: number, share: number): ReducedCurve {
  const potential = (depth: number): number => v0 * Math.exp(-decay * (depth - from));
  return {
    potential,
    share: (depth) => share + (depth - from) + (v0 * Math.expm1(-decay * (depth - from))) / decay,
  };
}

function interpolate(table: PotentialTable, depth: number, column: 'log' | 'share'): number {
  const k = panelOf(table.depth, depth);
  const width = table.depth[k + 1]! - table.depth[k]!;
  const values = table[column];
  const slopes = column === 'log' ? table.logSlope : table.shareSlope;
  const curvatures = column === 'log' ? table.logCurvature : table.shareCurvature;
  return quinticHermite(
    (depth - table.depth[k]!) / width,
    width,
    values[k]!,
    slopes[k]!,
    curvatures[k]!,
    values[k + 1]!,
    slopes[k + 1]!,
    curvatures[k + 1]!,
  );
}

/** Panel that holds a depth between the first and the last node. */
function panelOf(depths: Float64Array, depth: number): number {
  let low = 0;
  let high = depths.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (depths[middle]! <= depth) low = middle;
    else high = middle;
  }
  return low;
}

function checkedDepth(depthNm: number): number {
  if (depthNm >= 0 && Number.isFinite(depthNm)) return depthNm;
  throw new InversionError('bad-depth', `A depth below the surface cannot be ${depthNm} nm.`);
}
