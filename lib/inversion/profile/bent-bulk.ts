import { BOLTZMANN_EV_PER_K } from '../electrostatics/constants';
import { debyeLengthNm } from '../electrostatics/debye-length';
import { InversionError } from '../errors';
import { isNumber, isPositive } from '../fit/number-range';
import type { FitInput, SemiconductorBulk } from '../types';

/** Widest gap of the materials in use is 3.3 eV; no band bends further. */
const LARGEST_BENDING_EV = 3.5;
/** Past strong inversion the depth hardly grows any more while exponentials overflow. */
const PAST_INVERSION = 250;
/** The bulk is searched over this factor both ways without a prior, over so many of its σ with one. */
export const BULK_FACTOR = 100;
const BULK_SIGMAS = 6;

/** φ_F/kT of the majority concentration; ∞ without minority carriers. n_i of a cold wide gap is too small to divide by. */
export function fermiOf(bulkPerCm3: number, { intrinsicPerCm3 }: SemiconductorBulk): number {
  return intrinsicPerCm3 === null ? Infinity : Math.log(bulkPerCm3) - Math.log(intrinsicPerCm3);
}

export function largestBulkOf({ parameters }: FitInput, given: number): number {
  const setting = parameters.bulkPerCm3;
  if (!setting || setting.held) return given;
  const { prior } = setting;
  return Math.min(given * BULK_FACTOR, prior ? prior.mean + BULK_SIGMAS * prior.sigma : Infinity);
}

/**
 * v_s at which the edge leaves the scan: in depletion v = (depth/L_D)²/2 below the point where the bands are flat, and a saturating
 * fraction sees its edge where e^(−v) has fallen to 1/K.
 */
export function largestDepletion(
  deepestInLengths: number,
  { response }: FitInput,
  bulkPerCm3: number,
  bulk: SemiconductorBulk,
): number {
  const seen =
    response.kind === 'saturating-fraction' ? Math.log1p(bulkPerCm3 / response.halfPerCm3) : 0;
  const leaving = (Math.sqrt(seen) + deepestInLengths / Math.SQRT2) ** 2 + 1;
  const kT = BOLTZMANN_EV_PER_K * bulk.temperatureK;
  const inverted = PAST_INVERSION + 2 * fermiOf(bulkPerCm3, bulk);
  return Math.min(Math.max(5, leaving), LARGEST_BENDING_EV / kT, inverted);
}

export function bulkOf({ semiconductor, polarity, response }: FitInput): SemiconductorBulk {
  if (!semiconductor) {
    throw new InversionError(
      'no-semiconductor',
      'Band bending needs the semiconductor: its permittivity, temperature and intrinsic concentration.',
    );
  }
  if (polarity === 'accumulation' && response.kind === 'two-level') {
    throw new InversionError(
      'wrong-response',
      'An accumulated surface holds more carriers than the bulk, which a two-level fraction cannot show; use the saturating fraction.',
    );
  }
  for (const [value, name] of [
    [semiconductor.relativePermittivity, 'relative permittivity'],
    [semiconductor.temperatureK, 'temperature (K)'],
  ] as const) {
    if (!isPositive(value))
      throw new InversionError('bad-semiconductor', `The ${name} cannot be ${value}.`);
  }
  const { intrinsicPerCm3 } = semiconductor;
  if (intrinsicPerCm3 !== null && !(intrinsicPerCm3 > 0 && isNumber(intrinsicPerCm3))) {
    throw new InversionError(
      'bad-semiconductor',
      `The intrinsic concentration (cm⁻³) cannot be ${intrinsicPerCm3}.`,
    );
  }
  return semiconductor;
}

export function givenBulk({ parameters, carriers }: FitInput): number {
  const setting = parameters.bulkPerCm3;
  const given = setting?.prior?.mean ?? setting?.value ?? carriers.bulkPerCm3;
  if (given !== null && given !== undefined && isPositive(given)) return given;
  throw new InversionError(
    'no-bulk-concentration',
    'Band bending needs the carrier concentration of the bulk, a positive number of cm⁻³.',
  );
}

/** Factor between neighbouring bulk concentrations of the search: one σ of the prior, or 1.6 without one. */
export function spreadOf({ parameters }: FitInput): number {
  const prior = parameters.bulkPerCm3?.prior;
  return prior ? 1 + Math.min(1, prior.sigma / prior.mean) : 1.6;
}

export function debyeOf(
  bulkPerCm3: number,
  { relativePermittivity, temperatureK }: SemiconductorBulk,
): number {
  const exact = (value: number) => ({ value, sigma: 0 });
  return debyeLengthNm({
    bulkPerCm3: exact(bulkPerCm3),
    relativePermittivity: exact(relativePermittivity),
    temperatureK: exact(temperatureK),
  }).value;
}
