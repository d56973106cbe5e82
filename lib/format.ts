/**
 * One rule for numbers, everywhere. A number is rounded to what its uncertainty supports
 * (Particle Data Group rounding rule, Review of Particle Physics, introduction); without an
 * uncertainty it is given to a stated number of significant digits.
 */

export type IntervalEnds = readonly [number | null, number | null];

const MINUS = '−';
const SUPERSCRIPTS: Record<string, string> = {
  '-': '⁻', '0': '⁰', '1': '¹', '2': '²', '3': '³', '4': '⁴', '5': '⁵', '6': '⁶', '7': '⁷', '8': '⁸', '9': '⁹',
};

/**
 * Decimals that an uncertainty supports. With its three leading digits: 100 to 354 keeps two
 * digits, 355 to 949 one, 950 to 999 rounds up to 1000 and keeps two. Negative for tens and more.
 */
export function decimalsFor(uncertainty: number): number {
  if (!(uncertainty > 0) || !Number.isFinite(uncertainty)) return 0;
  const exponent = Math.floor(Math.log10(uncertainty));
  const leading = Math.round(uncertainty / 10 ** (exponent - 2));
  if (leading >= 950) return -exponent;
  return leading < 355 ? 1 - exponent : -exponent;
}

/** A number with so many decimals; negative decimals round to tens, hundreds… */
export function withDecimals(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return '–';
  const step = 10 ** Math.max(-decimals, 0);
  const rounded = decimals < 0 ? Math.round(value / step) * step : value;
  const text = rounded.toFixed(Math.min(Math.max(decimals, 0), 20));
  return Number(text) === 0 ? text.replace('-', '') : text.replace('-', MINUS);
}

/** A number to so many significant digits, as 6.2×10¹⁵ when it is very large or very small. */
export function significant(value: number, digits = 3): string {
  if (!Number.isFinite(value)) return '–';
  if (value === 0) return '0';
  const [mantissa = '0', exponentText = '0'] = value.toExponential(digits - 1).split('e');
  const exponent = Number(exponentText);
  if (exponent < -3 || exponent > 5) return `${mantissa.replace('-', MINUS)}×${powerOfTen(exponent)}`;
  return withDecimals(value, digits - 1 - exponent);
}

export function powerOfTen(exponent: number): string {
  const raised = [...String(exponent)].map((character) => SUPERSCRIPTS[character] ?? character);
  return `10${raised.join('')}`;
}

export interface IntervalParts {
  value: string;
  /** "+2.1" and "−1.9"; null when that side is open. */
  upper: string | null;
  lower: string | null;
}

/** Value and asymmetric interval rounded alike, to what the smaller side supports. */
export function intervalParts(value: number, [low, high]: IntervalEnds): IntervalParts {
  const below = low === null ? null : value - low;
  const above = high === null ? null : high - value;
  const sides = [below, above].filter((side): side is number => side !== null && side > 0);
  if (sides.length === 0) return { value: significant(value), upper: null, lower: null };
  const decimals = decimalsFor(Math.min(...sides));
  return {
    value: withDecimals(value, decimals),
    upper: above === null ? null : `+${withDecimals(Math.max(above, 0), decimals)}`,
    lower: below === null ? null : `${MINUS}${withDecimals(Math.max(below, 0), decimals)}`,
  };
}

/** "78.4 +2.1 −1.9"; a side that is open is left out. */
export function withInterval(value: number, interval: IntervalEnds): string {
  const parts = intervalParts(value, interval);
  return [parts.value, parts.upper, parts.lower].filter((part) => part !== null).join(' ');
}

/** "0.742(4)": the uncertainty in units of the last digit; "6.2(4)×10¹⁵" where the number is large. */
export function withSigma(value: number, sigma: number | null): string {
  if (sigma === null || !(sigma > 0)) return significant(value);
  const exponent = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)));
  if (exponent > 5 || exponent < -3) {
    const scale = 10 ** exponent;
    return `${withSigma(value / scale, sigma / scale)}×${powerOfTen(exponent)}`;
  }
  const decimals = decimalsFor(sigma);
  if (decimals <= 0) return `${withDecimals(value, decimals)} ± ${withDecimals(sigma, decimals)}`;
  const digits = Math.round(sigma * 10 ** decimals);
  return sigma < 1
    ? `${withDecimals(value, decimals)}(${digits})`
    : `${withDecimals(value, decimals)}(${withDecimals(sigma, decimals)})`;
}
