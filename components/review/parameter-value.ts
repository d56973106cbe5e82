import { asEntered, formatWithInterval, type IntervalEnds, type ResultParts } from '@/lib/format';
import type { Fit } from '@/lib/schemas/fit';

import { moreAndLess } from './parameter-words';

type FitParameter = Fit['answer']['parameters'][number];

/** A fitted value as the whole product writes results; `unit` is empty for a pure number. */
export function parameterParts(parameter: FitParameter, unit: string): ResultParts {
  const [more, less] = moreAndLess(parameter.name);
  const interval = intervalToShow(parameter);
  return formatWithInterval(parameter.value, interval, parameter.sigma, unit, {
    interval95: parameter.interval95,
    words: { more, less },
  });
}

/**
 * A value that sits on its bound has no interval on that side, only a limit on the other. Without a
 * likelihood interval σ stands for it (null).
 */
function intervalToShow({ interval68, sigma, atBound }: FitParameter): IntervalEnds | null {
  const [low, high] = interval68;
  if (low === null && high === null && sigma !== null) return null;
  return [atBound === 'lower' ? null : low, atBound === 'upper' ? null : high];
}

/** One line of plain text: "78.4 +2.1 −1.9 nm", "deeper than 112 nm (95 %)", "1 (held)". */
export function parameterText(parameter: FitParameter, unit: string): string {
  if (parameter.held)
    return `${[asEntered(parameter.value), unit].filter(Boolean).join(' ')} (held)`;
  return parameterParts(parameter, unit).sentence;
}
