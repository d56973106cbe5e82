import { InversionError } from '../errors';
import { sameEnergy } from '../stopping/same-energy';
import type { ScanPoint } from '../types';

/** σ that one hour of counting would give at an energy; after t hours it is σ₁/√t. */
export interface EnergySigma {
  energyKeV: number;
  sigma: number;
}

/** One number for all energies, or a table in any order that is interpolated in ln E. */
export type OneHourSigma = number | readonly EnergySigma[];

/**
 * σ₁ at an energy: the number itself; from a table, ln σ₁ linear in ln E between the two neighbours, and that of the nearest
 * energy outside the table.
 *
 * @throws InversionError 'bad-sigma' or 'bad-energy' for a table that is empty or holds numbers that are not positive.
 */
export function oneHourSigmaAt(oneHour: OneHourSigma, energyKeV: number): number {
  if (typeof oneHour === 'number') return positive(oneHour);
  if (oneHour.length === 0)
    throw new InversionError('bad-sigma', 'The table of one-hour uncertainties is empty.');
  const table = [...oneHour].sort((a, b) => a.energyKeV - b.energyKeV);
  for (const { energyKeV: energy, sigma } of table) {
    positive(sigma);
    if (energy > 0 && Number.isFinite(energy)) continue;
    throw new InversionError(
      'bad-energy',
      `A one-hour uncertainty cannot belong to ${energy} keV.`,
    );
  }
  const next = table.findIndex((row) => row.energyKeV >= energyKeV);
  if (next <= 0) return table[next < 0 ? table.length - 1 : 0]!.sigma;
  const [low, high] = [table[next - 1]!, table[next]!];
  if (sameEnergy(high.energyKeV, energyKeV)) return high.sigma;
  const t = Math.log(energyKeV / low.energyKeV) / Math.log(high.energyKeV / low.energyKeV);
  return low.sigma * (high.sigma / low.sigma) ** t;
}

function positive(sigma: number): number {
  if (sigma > 0 && Number.isFinite(sigma)) return sigma;
  throw new InversionError(
    'bad-sigma',
    `The uncertainty after one hour must be a positive number, not ${sigma}.`,
  );
}

/**
 * σ₁ = σ_i·√t_i of the points in use, from the hours that each took: a table for `OneHourSigma`.
 *
 * @param hours one number for each point, or one for all.
 * @throws InversionError 'bad-hours'.
 */
export function oneHourSigmas(
  points: readonly ScanPoint[],
  hours: number | readonly number[],
): EnergySigma[] {
  if (typeof hours !== 'number' && hours.length !== points.length) {
    throw new InversionError(
      'bad-hours',
      `${points.length} points need as many counting times, not ${hours.length}.`,
    );
  }
  return points.flatMap(({ energyKeV, sigma, enabled }, index) => {
    if (!enabled) return [];
    const taken = typeof hours === 'number' ? hours : hours[index]!;
    checkHours(taken);
    return { energyKeV, sigma: sigma * Math.sqrt(taken) };
  });
}

/** @throws InversionError 'bad-hours' for hours that are not a positive number. */
export function checkHours(hours: number): void {
  if (hours > 0 && Number.isFinite(hours)) return;
  throw new InversionError(
    'bad-hours',
    `Counting time must be a positive number of hours, not ${hours}.`,
  );
}
