import { quantileOf, TAIL_68, TAIL_95 } from '../statistics/quantile';
import { InversionError } from '../errors';
import type { PreparedFit } from '../fit/prepared-fit';
import { valuesOf } from '../fit/theta-of';
import { profileValue } from '../profile/profile-value';
import type { FitAnswer, ParameterValues } from '../types';
import { emptyBands, type Bands } from './bands';

/**
 * Pointwise 68 and 95 % quantiles of the profile value over resampled fits (linear between order statistics).
 *
 * @param rows row-major, one column per prepared.freeNames.
 * @throws InversionError when rows do not fill whole rows, or are fewer than two.
 */
export function bootstrapBands(
  prepared: PreparedFit,
  answer: FitAnswer,
  rows: Float64Array,
  depthsNm: ArrayLike<number>,
): Bands {
  const { freeNames } = prepared;
  const count = rows.length / freeNames.length;
  if (!(Number.isInteger(count) && count >= 2)) {
    throw new InversionError(
      'bad-rows',
      `Bands need at least two whole rows of ${freeNames.length} parameters.`,
    );
  }
  const fixed = valuesOf(answer);
  const values = Array.from({ length: count }, (_, r) => {
    const row: ParameterValues = { ...fixed };
    freeNames.forEach((name, k) => {
      row[name] = rows[r * freeNames.length + k]!;
    });
    return profileValue(prepared, row);
  });
  const bands = emptyBands('bootstrap', depthsNm);
  const column = new Float64Array(count);
  for (let k = 0; k < depthsNm.length; k++) {
    for (let r = 0; r < count; r++) column[r] = values[r]!(depthsNm[k]!);
    column.sort();
    bands.lower68[k] = quantileOf(column, TAIL_68);
    bands.upper68[k] = quantileOf(column, 1 - TAIL_68);
    bands.lower95[k] = quantileOf(column, TAIL_95);
    bands.upper95[k] = quantileOf(column, 1 - TAIL_95);
  }
  return bands;
}
