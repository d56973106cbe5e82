import { InversionError } from '../errors';

/** @throws InversionError unless value is a finite number above 0, or at 0 where zero is allowed. */
export function checkNumber(value: number, name: string, unit: string, zeroAllowed = false): void {
  if (Number.isFinite(value) && (value > 0 || (zeroAllowed && value === 0))) return;
  const expected = zeroAllowed ? 'zero or a positive number' : 'a positive number';
  throw new InversionError(
    'bad-number',
    `The ${name} must be ${expected} of ${unit}, not ${value}.`,
  );
}
