import { parseNumber } from '@/lib/files/parse-number';

/** A number typed with a decimal point or comma; null when blank, NaN when it is no number. */
export function typedNumber(text: string): number | null {
  if (text.trim() === '') return null;
  return parseNumber(text, 'point') ?? parseNumber(text, 'comma') ?? Number.NaN;
}
