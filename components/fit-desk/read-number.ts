export interface NumberRange {
  min?: number;
  max?: number;
  /** The number must be larger than this. */
  above?: number;
  whole?: boolean;
}

export type ReadNumber = { ok: true; value: number | null } | { ok: false; message: string };

/** A typed number, with a decimal point or comma; blank is "not known", never zero. */
export function readNumber(
  text: string,
  label: string,
  range: NumberRange,
  optional: boolean,
): ReadNumber {
  const trimmed = text.trim().replace(',', '.');
  if (trimmed === '')
    return optional
      ? { ok: true, value: null }
      : { ok: false, message: `${label}: a number is needed.` };
  const value = Number(trimmed);
  if (!Number.isFinite(value))
    return { ok: false, message: `${label}: expected a number such as 78.4 or 6.2e15.` };
  const wrong = outside(value, range);
  return wrong ? { ok: false, message: `${label}: expected ${wrong}.` } : { ok: true, value };
}

function outside(value: number, { min, max, above, whole }: NumberRange): string | null {
  if (whole && !Number.isInteger(value)) return 'a whole number';
  if (above !== undefined && !(value > above)) return `a number above ${above}`;
  if (min !== undefined && value < min) return `a number of at least ${min}`;
  if (max !== undefined && value > max) return `a number of at most ${max}`;
  return null;
}

/** A number as a field shows it, to be edited: 78.4, and 6.2e15 where the plain digits would not be read. */
export function numberText(value: number | null): string {
  if (value === null) return '';
  const size = Math.abs(value);
  const plain = value === 0 || (size >= 1e-4 && size < 1e7);
  return plain ? String(value) : value.toExponential().replace('e+', 'e');
}
