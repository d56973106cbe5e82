import { foldAt, predictFromFold } from '../fit/evaluate';
import type { PreparedFit } from '../fit/prepared-fit';
import { thetaOf } from '../fit/theta-of';
import type { ParameterValues } from '../types';

/**
 * ŷ of every point of the scan, in its order, enabled or not; NaN for a switched-off point outside the stopping set.
 *
 * @throws InversionError for values that the trial profile cannot take.
 */
export function foldScan(prepared: PreparedFit, values: ParameterValues): Float64Array {
  const { model, work } = prepared.problem;
  const theta = thetaOf(prepared, values);
  foldAt(model, work, theta);
  predictFromFold(model, work, theta);
  const answer = new Float64Array(prepared.input.points.length).fill(NaN);
  for (let row = 0; row < model.rowCount; row++)
    answer[model.pointOfRow[row]!] = work.predicted[row]!;
  return answer;
}
