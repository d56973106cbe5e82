import {
  intervalParts,
  significant,
  withDecimals,
  decimalsFor,
  type IntervalParts,
} from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';

import { moreAndLess } from './parameter-words';

type FitParameter = Fit['answer']['parameters'][number];

export type ParameterWords =
  | { kind: 'held'; value: string }
  | { kind: 'two-sided'; parts: IntervalParts }
  | { kind: 'one-sided'; text: string; limit: string; unit: string }
  | { kind: 'open'; value: string };

/**
 * How a fitted value may honestly be written. With both sides of the 68 % interval closed: value
 * and both sides. With one side open: only the 95 % limit, as "deeper than 112 nm (95 %)".
 */
export function parameterWords(parameter: FitParameter, unit: string): ParameterWords {
  if (parameter.held) return { kind: 'held', value: significant(parameter.value, 4) };
  const [low68, high68] = parameter.interval68;
  if (low68 !== null && high68 !== null) {
    return { kind: 'two-sided', parts: intervalParts(parameter.value, [low68, high68]) };
  }
  const limit = limitWords(parameter);
  return limit
    ? {
        kind: 'one-sided',
        text: [limit.word, limit.value, unit, '(95 %)'].filter(Boolean).join(' '),
        limit: limit.value,
        unit,
      }
    : { kind: 'open', value: significant(parameter.value, 3) };
}

function limitWords(parameter: FitParameter): { word: string; value: string } | null {
  const [low, high] = parameter.interval95;
  const [more, less] = moreAndLess(parameter.name);
  const spread = (end: number) => Math.abs(end - parameter.value);
  if (low !== null && high === null) return { word: more, value: roundedTo(low, spread(low)) };
  if (high !== null && low === null) return { word: less, value: roundedTo(high, spread(high)) };
  return null;
}

function roundedTo(value: number, spread: number): string {
  return spread > 0 ? withDecimals(value, decimalsFor(spread)) : significant(value);
}

/** One line of plain text: "78.4 +2.1 −1.9 nm", "deeper than 112 nm (95 %)", "1 (held)". */
export function parameterText(parameter: FitParameter, unit: string): string {
  const words = parameterWords(parameter, unit);
  const withUnit = (text: string) => (unit === '' ? text : `${text} ${unit}`);
  switch (words.kind) {
    case 'held':
      return `${withUnit(words.value)} (held)`;
    case 'one-sided':
      return words.text;
    case 'open':
      return `${withUnit(words.value)} (no interval)`;
    case 'two-sided':
      return withUnit(
        [words.parts.value, words.parts.upper, words.parts.lower].filter(Boolean).join(' '),
      );
  }
}
