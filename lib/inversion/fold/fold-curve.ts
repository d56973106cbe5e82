import { foldAt, predictFromFold } from '../fit/evaluate';
import type { Model } from '../fit/model';
import type { PreparedFit } from '../fit/prepared-fit';
import { thetaOf } from '../fit/theta-of';
import { createWorkspace } from '../fit/workspace';
import { stoppingProfileAt } from '../stopping/stopping-profile-at';
import type { ParameterValues } from '../types';
import { unweighted } from '../fit/sensitivity';
import { compileKernel } from './kernel';

/**
 * ŷ at any energies inside the stopping set, for a smooth curve. The stopping profiles of the energies asked for last are
 * kept, so that dragging an edge only folds.
 *
 * @throws InversionError 'energy-outside-stopping-set', or for values that the trial profile cannot take.
 */
export function foldCurve(
  prepared: PreparedFit,
  values: ParameterValues,
  energiesKeV: ArrayLike<number>,
): Float64Array {
  const { curves } = prepared;
  const key = Array.from(energiesKeV).join(' ');
  if (!curves.fold || curves.key !== key) {
    curves.fold = compileCurve(prepared, Array.from(energiesKeV));
    curves.key = key;
  }
  return curves.fold(thetaOf(prepared, values));
}

function compileCurve(
  { input, problem }: PreparedFit,
  energiesKeV: readonly number[],
): (theta: Float64Array) => Float64Array {
  const kernel = compileKernel(
    energiesKeV.map((energy) => stoppingProfileAt(input.stopping, energy)),
  );
  const model: Model = { ...problem.model, ...unweighted(kernel) };
  const work = createWorkspace(model);
  return (theta) => {
    foldAt(model, work, theta);
    predictFromFold(model, work, theta);
    return Float64Array.from(work.predicted);
  };
}
