import { foldAt } from '../fit/evaluate';
import type { PreparedFit } from '../fit/prepared-fit';
import { thetaOf } from '../fit/theta-of';
import { RESPONSES } from '../response/responses';
import type { ParameterValues } from '../types';
import { carriersAt } from './profile-value';

/**
 * Smallest uniform change of the profile value on its poor side that moves at least one enabled point by its σ:
 * min_i of valueOfChange(σ_i/C_i) with C_i the share of the stops of point i on the poor side of the edge. A side can hold
 * fewer carriers than this and the scan would not show it. Null where no stop lies on that side or the levels are equal.
 */
export function floorOf(prepared: PreparedFit, values: ParameterValues): number | null {
  const { input, problem } = prepared;
  // Accumulated bent bands hold more than the bulk everywhere: there is no poor side.
  if (input.profile === 'band-bending' && input.polarity === 'accumulation') return null;
  const { model, work } = problem;
  foldAt(model, work, thetaOf(prepared, values));
  let smallest = Infinity;
  for (let row = 0; row < model.rowCount; row++) {
    const populated = work.fold.share[row]!;
    const poor =
      input.polarity === 'depletion'
        ? 1 - populated - (model.capNm > 0 ? work.capShare[row]! : 0)
        : populated;
    const inverse = model.whitener.inverseSigma[row]!;
    if (poor > 1e-12 && inverse > 0) smallest = Math.min(smallest, 1 / (inverse * poor));
  }
  const floor = RESPONSES[input.response.kind].valueOfChange(
    smallest,
    values.levelBulk! - values.levelTop!,
    { ...input, carriers: carriersAt(input, values) },
  );
  return Number.isFinite(floor) ? floor : null;
}
