import { MAX_BINS } from '../constants';
import { InversionError } from '../errors';
import type { StoppingProfile } from '../types';

export interface StoppingProfileTable {
  energyKeV: number;
  /** B bin centres or B + 1 bin edges, nm, strictly ascending. */
  positionsNm: ArrayLike<number>;
  positionsAre: 'centres' | 'edges';
  /** B counts, or densities per nm. */
  weights: ArrayLike<number>;
  weightsAre: 'counts' | 'density';
  /** Share of the implanted muons that stopped elsewhere (backscattered, or past the last bin). */
  lostShare?: number | null;
}

/**
 * A stopping profile as masses per bin: n_b = counts_b (or density_b × width_b) over their sum.
 * Centres become edges at midpoints; the first edge lies half a bin before the first centre, or at 0
 * where that would be outside the stack.
 *
 * @throws InversionError for an energy ≤ 0, positions that are not finite, ≥ 0 and ascending, weights of
 * the wrong number, negative or not finite, an empty histogram, or a lost share outside [0, 1).
 */
export function createStoppingProfile(table: StoppingProfileTable): StoppingProfile {
  const { energyKeV, weights } = table;
  const lostShare = table.lostShare ?? null;
  if (!(energyKeV > 0 && Number.isFinite(energyKeV))) {
    throw new InversionError(
      'bad-energy',
      `An implantation energy must be a positive number of keV, not ${energyKeV}.`,
    );
  }
  if (lostShare !== null && !(lostShare >= 0 && lostShare < 1)) {
    throw new InversionError(
      'bad-lost-share',
      `The lost share at ${energyKeV} keV must lie between 0 and 1, not ${lostShare}.`,
      { energyKeV },
    );
  }
  checkPositions(table);
  const edgesNm =
    table.positionsAre === 'edges'
      ? Float64Array.from(table.positionsNm)
      : edgesOf(table.positionsNm);
  const bins = edgesNm.length - 1;
  if (weights.length !== bins) {
    throw new InversionError(
      'bin-count',
      `The stopping profile at ${energyKeV} keV has ${bins} depth bins but ${weights.length} weights.`,
      { energyKeV },
    );
  }
  return {
    energyKeV,
    edgesNm,
    mass: massesOf(table, edgesNm),
    lostShare,
    interpolatedBetween: null,
  };
}

function checkPositions({ energyKeV, positionsNm, positionsAre }: StoppingProfileTable): void {
  const fewest = positionsAre === 'edges' ? 3 : 2;
  if (positionsNm.length < fewest) {
    throw new InversionError(
      'too-few-bins',
      `The stopping profile at ${energyKeV} keV needs at least two depth bins.`,
      {
        energyKeV,
      },
    );
  }
  if (positionsNm.length > MAX_BINS + 1) {
    throw new InversionError(
      'too-many-bins',
      `The stopping profile at ${energyKeV} keV has ${positionsNm.length} depths; at most ${MAX_BINS} bins are taken.`,
      { energyKeV },
    );
  }
  for (let i = 0; i < positionsNm.length; i++) {
    const position = positionsNm[i]!;
    if (!(position >= 0 && Number.isFinite(position))) {
      throw new InversionError(
        'bad-depth',
        `Depth ${i + 1} of the stopping profile at ${energyKeV} keV is ${position}; depths must be finite and not negative.`,
        { energyKeV, index: i },
      );
    }
    if (i > 0 && !(position > positionsNm[i - 1]!)) {
      throw new InversionError(
        'depths-out-of-order',
        `Depth ${i + 1} of the stopping profile at ${energyKeV} keV (${position} nm) does not lie below the one before it (${positionsNm[i - 1]!} nm).`,
        { energyKeV, index: i },
      );
    }
  }
}

function edgesOf(centresNm: ArrayLike<number>): Float64Array {
  const count = centresNm.length;
  const edges = new Float64Array(count + 1);
  edges[0] = Math.max(0, centresNm[0]! - (centresNm[1]! - centresNm[0]!) / 2);
  for (let b = 1; b < count; b++) edges[b] = (centresNm[b - 1]! + centresNm[b]!) / 2;
  edges[count] = centresNm[count - 1]! + (centresNm[count - 1]! - centresNm[count - 2]!) / 2;
  return edges;
}

function massesOf(
  { energyKeV, weights, weightsAre }: StoppingProfileTable,
  edgesNm: Float64Array,
): Float64Array {
  const mass = new Float64Array(weights.length);
  let total = 0;
  for (let b = 0; b < mass.length; b++) {
    const weight = weights[b]!;
    if (!(weight >= 0 && Number.isFinite(weight))) {
      throw new InversionError(
        'bad-weight',
        `Bin ${b + 1} of the stopping profile at ${energyKeV} keV holds ${weight}; weights must be finite and not negative.`,
        { energyKeV, index: b },
      );
    }
    mass[b] = weightsAre === 'counts' ? weight : weight * (edgesNm[b + 1]! - edgesNm[b]!);
    total += mass[b]!;
  }
  if (!(total > 0 && Number.isFinite(total))) {
    throw new InversionError(
      'empty-stopping-profile',
      `The stopping profile at ${energyKeV} keV holds no stopped muons.`,
      {
        energyKeV,
      },
    );
  }
  for (let b = 0; b < mass.length; b++) mass[b] = mass[b]! / total;
  return mass;
}
