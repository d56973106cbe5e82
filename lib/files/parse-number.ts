import type { Decimal } from './table';

const WITH_POINT = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eEdD][+-]?\d+)?$/;
const WITH_COMMA = /^[+-]?(?:\d+,?\d*|,\d+)(?:[eEdD][+-]?\d+)?$/;
const NOT_A_NUMBER =
  /^[+-]?(?:nan|inf|infinity|n\/a|na|null|none|#num!|#n\/a|#div\/0!|#wert!|1\.#.*|-+)$/i;

/**
 * The number in a cell, or null. Strict: no thousands marks, no units, nothing after the number.
 * Accepts the typographic minus and Fortran's D exponent. NaN, infinities and overflow are null.
 */
export function parseNumber(cell: string, decimal: Decimal): number | null {
  const text = cell.trim().replace(/^[−–]/, '-');
  if (!(decimal === 'comma' ? WITH_COMMA : WITH_POINT).test(text)) return null;
  const value = Number(text.replace(',', '.').replace(/[dD]/, 'e'));
  return Number.isFinite(value) ? value : null;
}

/** Whether a cell says in words that there is no number: NaN, inf, n/a, dashes. */
export function saysNotANumber(cell: string): boolean {
  return NOT_A_NUMBER.test(cell.trim());
}

/** Why `parseNumber` gave null, as the end of a sentence: `expected a number for σ, found "abc".` */
export function whyNotANumber(cell: string, decimal: Decimal, what: string): string {
  const text = cell.trim();
  if (text === '') return `expected a number for ${what}, found an empty cell.`;
  if (saysNotANumber(text)) return `expected a finite number for ${what}, found "${clip(text)}".`;
  const other: Decimal = decimal === 'comma' ? 'point' : 'comma';
  const hint =
    parseNumber(text, other) !== null
      ? ` (this file is read with a decimal ${decimal}; the cell has a decimal ${other})`
      : '';
  return `expected a number for ${what}, found "${clip(text)}"${hint}.`;
}

function clip(text: string): string {
  return text.length > 40 ? `${text.slice(0, 40)}…` : text;
}
