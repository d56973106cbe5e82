import { MAX_BINS } from '../constants';
import { InversionError } from '../errors';
import type { StoppingProfile, StoppingSet } from '../types';

/** A set is looked through once: the largest holds millions of numbers, and every change on the desk makes a fit. */
const sound = new WeakSet<StoppingSet>();
/** Masses are shares: they add up to one but for rounding. */
const TOTAL_TOLERANCE = 1e-6;

/**
 * @throws InversionError 'bad-stopping-profile' for a profile that createStoppingProfile would not have made: edges that are not
 * finite and ascending, masses that are not one per bin, not finite, negative, or do not add up to one.
 */
export function checkStoppingSet(set: StoppingSet): void {
  if (sound.has(set)) return;
  if (set.profiles.length === 0) {
    throw new InversionError(
      'empty-stopping-set',
      'A fit needs a stopping set with at least one stopping profile.',
    );
  }
  set.profiles.forEach(checkProfile);
  sound.add(set);
}

function checkProfile({ energyKeV, edgesNm, mass }: StoppingProfile): void {
  const refuse = (what: string): never => {
    throw new InversionError(
      'bad-stopping-profile',
      `The stopping profile at ${energyKeV} keV ${what}.`,
      { energyKeV },
    );
  };
  if (!(energyKeV > 0 && Number.isFinite(energyKeV))) refuse('has no positive energy');
  if (mass.length < 1 || mass.length > MAX_BINS || edgesNm.length !== mass.length + 1) {
    refuse(
      `has ${mass.length} masses between ${edgesNm.length} edges; 1 to ${MAX_BINS} masses and one edge more were expected`,
    );
  }
  let total = 0;
  for (let b = 0; b < mass.length; b++) {
    if (!(mass[b]! >= 0)) refuse(`holds a mass of ${mass[b]} in bin ${b + 1}`);
    if (!(edgesNm[b]! >= 0 && edgesNm[b + 1]! > edgesNm[b]!))
      refuse(`has bin ${b + 1} from ${edgesNm[b]} to ${edgesNm[b + 1]} nm`);
    total += mass[b]!;
  }
  if (!Number.isFinite(edgesNm[mass.length]!)) refuse('has no end');
  if (!(Math.abs(total - 1) <= TOTAL_TOLERANCE)) refuse(`holds masses that add up to ${total}`);
}
