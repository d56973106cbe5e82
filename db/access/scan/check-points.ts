import { AppError } from '@/lib/errors';
import type { Observable } from '@/lib/inversion/index';
import type { TypedPoint } from '@/lib/schemas/scan';

/** As for files: a value outside its range by more than this many σ is a mistake and not noise. */
const NOISE_SIGMAS = 5;
const SAME_ENERGY = 1e-9;

/** Refuses typed points as a file with the same points would be refused; rows count from 1. */
export function checkPoints(points: readonly TypedPoint[], observable: Observable): void {
  const fields: Record<string, string> = {};
  points.forEach((point, index) => {
    const sentence = whyNot(point, points.slice(0, index), observable);
    if (sentence !== null) fields[`points.${index}`] = `Row ${index + 1}: ${sentence}`;
  });
  const [first] = Object.values(fields);
  if (first !== undefined) throw new AppError('invalid', first, fields);
}

function whyNot(
  { energyKeV, value, sigma }: TypedPoint,
  earlier: readonly TypedPoint[],
  observable: Observable,
): string | null {
  const twin = earlier.findIndex(
    (other) => Math.abs(other.energyKeV - energyKeV) <= SAME_ENERGY * energyKeV,
  );
  if (twin >= 0)
    return `expected each energy once, but ${energyKeV} keV stands in row ${twin + 1}.`;
  const top = observable === 'fraction' ? 1 : Infinity;
  if (value >= -NOISE_SIGMAS * sigma && value <= top + NOISE_SIGMAS * sigma) return null;
  const range = observable === 'fraction' ? 'a fraction between 0 and 1' : 'a rate of 0 or more';
  return `expected ${range} within ${NOISE_SIGMAS} σ, found ${value} ± ${sigma}.`;
}
