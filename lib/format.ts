/**
 * One rule for numbers, everywhere. A number is rounded to what its uncertainty supports
 * (Particle Data Group rounding rule, Review of Particle Physics, introduction); without an
 * uncertainty it is given to a stated number of significant digits.
 */

export type IntervalEnds = readonly [number | null, number | null];

const MINUS = '−';
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * Decimals that an uncertainty supports. With its three leading digits: 100 to 354 keeps two
 * digits, 355 to 949 one, 950 to 999 rounds up to 1000 and keeps two. Negative for tens and more.
 */
export function decimalsFor(uncertainty: number): number {
  if (!(uncertainty > 0) || !Number.isFinite(uncertainty)) return 0;
  // Read off the digits as they print: a logarithm can land on the wrong side of a power of ten.
  const [mantissa, power] = uncertainty.toExponential(2).split('e').map(Number);
  const exponent = power ?? 0;
  return (mantissa ?? 0) < 3.55 ? 1 - exponent : -exponent;
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
  if (exponent < -3 || exponent > 5)
    return `${mantissa.replace('-', MINUS)}×${powerOfTen(exponent)}`;
  return withDecimals(value, digits - 1 - exponent);
}

/** A number that a person set, with the digits they gave: "0.32", "1.1×10¹⁶". */
export function asEntered(value: number): string {
  const [mantissa = '0', exponent] = String(Number(value.toPrecision(12))).split('e');
  if (exponent !== undefined)
    return `${mantissa.replace('-', MINUS)}×${powerOfTen(Number(exponent))}`;
  if (Math.abs(value) < 1e6) return mantissa.replace('-', MINUS);
  const power = Math.floor(Math.log10(Math.abs(value)));
  return `${asEntered(value / 10 ** power)}×${powerOfTen(power)}`;
}

export function powerOfTen(exponent: number): string {
  const raised = String(exponent).replace('-', '⁻');
  return `10${raised.replace(/\d/g, (digit) => SUPERSCRIPTS[Number(digit)] ?? digit)}`;
}

export interface IntervalParts {
  value: string;
  /** "+2.1" and "−1.9"; null when that side is open. */
  upper: string | null;
  lower: string | null;
}

/** A side this much smaller than the other is a value on its bound, and does not set the digits. */
const SHORT_SIDE = 0.01;

function digitsSide(sides: readonly number[]): number {
  const larger = Math.max(...sides);
  const smaller = Math.min(...sides);
  return smaller < SHORT_SIDE * larger ? larger : smaller;
}

/** Value and asymmetric interval rounded alike, to what the smaller side supports. */
export function intervalParts(value: number, [low, high]: IntervalEnds): IntervalParts {
  const below = low === null ? null : value - low;
  const above = high === null ? null : high - value;
  const sides = [below, above].filter((side): side is number => side !== null && side > 0);
  if (sides.length === 0) return { value: significant(value), upper: null, lower: null };
  const decimals = decimalsFor(digitsSide(sides));
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

/** A result ready to be set in type; the strings have a real minus sign and no unit. */
export interface ResultParts {
  value: string;
  /** Without their signs; null where there is no such side. */
  plus: string | null;
  minus: string | null;
  /** Power of ten that value, plus and minus share; null for none. */
  exponent: number | null;
  unit: string;
  /** One line of text: `78.4 +2.1 −1.9 nm`, `0.742(4)`, `deeper than 112 nm (95 %)`. */
  sentence: string;
  /** The value with every digit, for hovering and copying. */
  full: string;
}

export interface ResultOptions {
  /** Gives the bound of a one-sided result; without it the 68 % bound is given. */
  interval95?: IntervalEnds | null;
  /** How a bound reads: `more than`, `less than` unless given (`deeper than`, `shallower than`). */
  words?: { more: string; less: string };
}

/**
 * A result with what is known of it. Both sides closed: `78.4 +2.1 −1.9 nm`, or `0.742(4)` when both
 * round to the same. One side open: a bound in words. Without an interval σ stands for it; without
 * either the plain value.
 */
export function formatWithInterval(
  value: number,
  interval68: IntervalEnds | null,
  sigma: number | null,
  unit = '',
  options: ResultOptions = {},
): ResultParts {
  const bare = withoutInterval(value, unit, value);
  if (!interval68)
    return sigma === null ? bare : twoSided(value, [value - sigma, value + sigma], unit);
  const [low, high] = interval68;
  if (low !== null && high !== null) return twoSided(value, [low, high], unit);
  if (low !== null || high !== null) return oneSided(value, interval68, unit, options);
  return { ...bare, sentence: `not determined by these data (best value ${bare.sentence})` };
}

/** A carrier concentration: `6.2×10¹⁵ cm⁻³`, or `6.2(4)×10¹⁵ cm⁻³` when σ is given. */
export function formatConcentration(perCm3: number, sigmaPerCm3: number | null = null): string {
  const digits = sigmaPerCm3 === null ? significant(perCm3, 2) : withSigma(perCm3, sigmaPerCm3);
  return `${digits} cm⁻³`;
}

/** A probability to two digits; below 0.0001 the digits would mean nothing. */
export function formatProbability(probability: number): string {
  return probability < 1e-4 ? 'below 0.0001' : String(Number(probability.toPrecision(2)));
}

function twoSided(
  value: number,
  [low, high]: readonly [number, number],
  unit: string,
): ResultParts {
  const exponent = sharedPower(Math.max(Math.abs(value), high - value, value - low));
  const scale = 10 ** (exponent ?? 0);
  const rounded = intervalParts(value / scale, [low / scale, high / scale]);
  const plus = rounded.upper?.slice(1) ?? null;
  const minus = rounded.lower?.slice(1) ?? null;
  if (plus === null || minus === null) return withoutInterval(value, unit, value);
  const symmetric = plus === minus;
  const digits = symmetric
    ? withSigma(value / scale, (high - low) / 2 / scale)
    : `${rounded.value} +${plus} ${MINUS}${minus}`;
  const power = exponent === null ? '' : `×${powerOfTen(exponent)}`;
  const body = power && !symmetric ? `(${digits})${power}` : `${digits}${power}`;
  return {
    value: rounded.value,
    plus,
    minus,
    exponent,
    unit,
    sentence: withUnit(body, unit),
    full: fullText(value, unit),
  };
}

function oneSided(
  value: number,
  [low, high]: IntervalEnds,
  unit: string,
  { interval95, words = { more: 'more than', less: 'less than' } }: ResultOptions,
): ResultParts {
  const at95 = interval95?.[low === null ? 1 : 0] ?? null;
  const shown = withoutInterval(at95 ?? low ?? high ?? value, unit, value);
  const level = at95 === null ? '68 %' : '95 %';
  const sentence = `${low === null ? words.less : words.more} ${shown.sentence} (${level})`;
  return { ...shown, sentence };
}

function withoutInterval(shown: number, unit: string, value: number): ResultParts {
  const exponent = sharedPower(Math.abs(shown));
  const digits = significant(shown / 10 ** (exponent ?? 0));
  const body = exponent === null ? digits : `${digits}×${powerOfTen(exponent)}`;
  return {
    value: digits,
    plus: null,
    minus: null,
    exponent,
    unit,
    sentence: withUnit(body, unit),
    full: fullText(value, unit),
  };
}

/** The power of ten from which `significant` writes one, too. */
function sharedPower(size: number): number | null {
  const exponent = Number(size.toExponential(2).split('e')[1]);
  return size !== 0 && (exponent < -3 || exponent > 5) ? exponent : null;
}

function withUnit(text: string, unit: string): string {
  return unit === '' ? text : `${text} ${unit}`;
}

function fullText(value: number, unit: string): string {
  return withUnit(String(value).replace(/-/g, MINUS), unit);
}
