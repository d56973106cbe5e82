import { quantileOf, TAIL_68, TAIL_95 } from '../statistics/quantile';
import { InversionError } from '../errors';
import type { PreparedFreeForm } from './prepare-free-form';
import { valueAtDepth } from './value-at-depth';

/** Pointwise bands of a free-form profile; null above the ceiling of a saturating fraction. */
export interface FreeFormBands {
  depthsNm: readonly number[];
  lower68: readonly (number | null)[];
  upper68: readonly (number | null)[];
  lower95: readonly (number | null)[];
  upper95: readonly (number | null)[];
}

/**
 * Pointwise 68 and 95 % quantiles over resampled profiles (linear between order statistics). They are those of the unknown u,
 * turned into values afterwards, so that a quantile above a ceiling is simply above it. What the bands leave out:
 * resampleFreeForm.
 *
 * @param rows row-major, as resampleFreeForm gives them, from any number of blocks.
 * @throws InversionError 'bad-rows' when rows do not fill whole rows, or fewer than two of them were solved.
 */
export function freeFormBands(
  prepared: PreparedFreeForm,
  rows: Float64Array,
  depthsNm: ArrayLike<number>,
): FreeFormBands {
  const { knotsNm, design, observation } = prepared;
  const { columns } = design;
  const solved = Array.from(
    { length: Math.floor(rows.length / columns) },
    (_, r) => r * columns,
  ).filter((at) => !Number.isNaN(rows[at]!));
  if (rows.length % columns !== 0 || solved.length < 2) {
    throw new InversionError(
      'bad-rows',
      `Bands need at least two whole rows of ${columns} values.`,
    );
  }
  const column = new Float64Array(solved.length);
  const bands = Array.from(depthsNm, (depthNm) => {
    solved.forEach((at, r) => {
      column[r] = valueAtDepth(knotsNm, rows, depthNm, at);
    });
    column.sort();
    const ends = (tail: number): [number | null, number | null] => {
      const low = observation.line.valueOf(quantileOf(column, tail));
      const high = observation.line.valueOf(quantileOf(column, 1 - tail));
      // A populated share falls with the concentration where the poor side was given more carriers than the other.
      return low !== null && high !== null && low > high ? [high, low] : [low, high];
    };
    return { depthNm, inner: ends(TAIL_68), outer: ends(TAIL_95) };
  });
  return {
    depthsNm: bands.map(({ depthNm }) => depthNm),
    lower68: bands.map(({ inner }) => inner[0]),
    upper68: bands.map(({ inner }) => inner[1]),
    lower95: bands.map(({ outer }) => outer[0]),
    upper95: bands.map(({ outer }) => outer[1]),
  };
}
