import { z } from 'zod';

export const ROLES = ['owner', 'analyst', 'reviewer', 'modeller'] as const;
export const roleSchema = z.enum(ROLES);
export type Role = z.infer<typeof roleSchema>;

export const idSchema = z.uuid('This address does not name anything we know.');

/** Required text: trimmed, with its own sentence when it is empty or too long. */
export const text = (label: string, max: number) =>
  z
    .string(`${label}: write something here.`)
    .trim()
    .min(1, `${label}: write something here.`)
    .max(max, `${label}: at most ${max} characters.`);

/** Optional text; blank is the empty string. */
export const optionalText = (label: string, max: number) =>
  z.string().trim().max(max, `${label}: at most ${max} characters.`).default('');

/** A number from a form field or JSON. Blank is null, never zero. */
const numberFrom = (label: string) =>
  z.preprocess(
    (raw) => {
      if (typeof raw !== 'string') return raw ?? null;
      const trimmed = raw.trim();
      return trimmed === '' ? null : Number(trimmed.replace(',', '.'));
    },
    z.number(`${label}: expected a number.`).nullable(),
  );

export const optionalNumber = (
  label: string,
  range: { min?: number; max?: number; above?: number } = {},
) =>
  numberFrom(label).refine(
    (value) =>
      value === null ||
      (Number.isFinite(value) &&
        value >= (range.min ?? -Infinity) &&
        value <= (range.max ?? Infinity) &&
        value > (range.above ?? -Infinity)),
    { error: `${label}: ${rangeWords(range)}.` },
  );

export const requiredNumber = (
  label: string,
  range: { min?: number; max?: number; above?: number } = {},
) =>
  optionalNumber(label, range)
    .refine((value) => value !== null, { error: `${label}: a number is needed.` })
    .transform((value) => value as number);

function rangeWords({ min, max, above }: { min?: number; max?: number; above?: number }): string {
  const low = above !== undefined ? `above ${above}` : min !== undefined ? `at least ${min}` : null;
  const high = max !== undefined ? `at most ${max}` : null;
  const words = [low, high].filter((part) => part !== null).join(' and ');
  return words === '' ? 'expected a number' : `expected a number ${words}`;
}

/** Moment in UTC as ISO 8601. */
export const momentSchema = z.iso.datetime();

/** Input of a verb that needs nothing but the row. */
export const byIdSchema = z.object({ id: idSchema });

/** A yes or no that may come from JSON or from the query of an address. */
export const flagSchema = z.preprocess(
  (raw) => (raw === 'true' ? true : raw === 'false' ? false : raw),
  z.boolean().default(false),
);
