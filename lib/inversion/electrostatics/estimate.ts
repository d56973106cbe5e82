import { InversionError } from '../errors';

/** A value and its standard uncertainty, in the same unit; σ = 0 where it is taken as exact. */
export interface Estimate {
  value: number;
  sigma: number;
}

/** What a number is called in a message, and its unit. */
export interface Naming {
  name: string;
  unit: string;
}

/**
 * y = c·Π xₖ^aₖ of independent xₖ > 0 with first-order uncertainty, exact for such a product: (σ_y/y)² = Σ (aₖ σₖ/xₖ)²
 * (Guide to the Expression of Uncertainty in Measurement, JCGM 100:2008, section 5.1.6, equation 12).
 */
export function powerLaw(
  coefficient: number,
  factors: readonly (readonly [x: Estimate, power: number])[],
): Estimate {
  let value = coefficient;
  let variance = 0;
  for (const [x, power] of factors) {
    value *= x.value ** power;
    variance += ((power * x.sigma) / x.value) ** 2;
  }
  return { value, sigma: Math.abs(value) * Math.sqrt(variance) };
}

/** @throws InversionError unless value > 0, σ ≥ 0 and both are finite. */
export function checkEstimate({ value, sigma }: Estimate, { name, unit }: Naming): void {
  checkPositive(value, { name, unit });
  if (!(sigma >= 0 && Number.isFinite(sigma))) {
    throw new InversionError(
      'bad-sigma',
      `The uncertainty of the ${name} cannot be ${sigma} ${unit}.`,
    );
  }
}

/** @throws InversionError unless value is a positive finite number. */
export function checkPositive(value: number, { name, unit }: Naming): void {
  if (!(value > 0 && Number.isFinite(value))) {
    throw new InversionError(
      'bad-number',
      `The ${name} must be a positive number of ${unit}, not ${value}.`,
    );
  }
}

export const DOPING: Naming = { name: 'doping', unit: 'cm⁻³' };
export const PERMITTIVITY: Naming = { name: 'relative permittivity', unit: 'ε₀' };
export const TEMPERATURE: Naming = { name: 'temperature', unit: 'K' };
export const INTRINSIC: Naming = { name: 'intrinsic concentration', unit: 'cm⁻³' };
export const BULK: Naming = { name: 'bulk carrier concentration', unit: 'cm⁻³' };
