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
  // Row by row: a profile may have to be made ready for the parameters of its row.
  const values = new Float64Array(depthsNm.length * count);
  const row: ParameterValues = valuesOf(answer);
  for (let r = 0; r < count; r++) {
    freeNames.forEach((name, k) => {
      row[name] = rows[r * freeNames.length + k]!;
    });
    const value = profileValue(prepared, row);
    for (let k = 0; k < depthsNm.length; k++) values[k * count + r] = value(depthsNm[k]!);
  }
  const bands = emptyBands('bootstrap', depthsNm);
  for (let k = 0; k < depthsNm.length; k++) {
    const column = values.subarray(k * count, (k + 1) * count).sort();
    bands.lower68[k] = quantileOf(column, TAIL_68);
    bands.upper68[k] = quantileOf(column, 1 - TAIL_68);
    bands.lower95[k] = quantileOf(column, TAIL_95);
    bands.upper95[k] = quantileOf(column, 1 - TAIL_95);
  }
  return bands;
}
