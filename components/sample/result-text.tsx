import { formatWithInterval } from '@/lib/format';
import type { FitRow } from '@/lib/schemas/fit';

const DEPTH_WORDS = { more: 'deeper than', less: 'shallower than' };
const WIDTH_WORDS = { more: 'wider than', less: 'narrower than' };

type ResultTextProps = { of: FitRow['edge']; quantity: 'depth' | 'width' };

/** An edge depth or width with its interval, as in every list; a dash where the fit has none. */
export function ResultText({ of: parameter, quantity }: ResultTextProps) {
  if (parameter === null) return <span aria-label="none">–</span>;
  if (parameter.held)
    return <>{formatWithInterval(parameter.value, null, null, 'nm').sentence}, held</>;
  const result = formatWithInterval(parameter.value, parameter.interval68, parameter.sigma, 'nm', {
    interval95: parameter.interval95,
    words: quantity === 'depth' ? DEPTH_WORDS : WIDTH_WORDS,
  });
  return <span title={result.full}>{result.sentence}</span>;
}
