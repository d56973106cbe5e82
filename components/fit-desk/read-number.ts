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
