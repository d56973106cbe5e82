import type { PreparedFit } from '../fit/prepared-fit';
import { valuesOf } from '../fit/theta-of';
import type { FitAnswer } from '../types';
import { reachOf } from './reach';

const EVEN = 200;
const ROUND_EDGE = 90;

/**
 * Up to 400 depths, nm below the cap, from 0 to the 99 % stopping quantile of the deepest enabled energy: evenly spaced,
 * and finer over the edge and its uncertainty, with the edge itself among them.
 */
export function defaultDepthGrid(prepared: PreparedFit, answer: FitAnswer): Float64Array {
  const values = valuesOf(answer);
  const endNm = Math.max(reachOf(prepared, values, 0.99), 1e-3);
  const { trial } = prepared.problem.model;
  const landmarks = trial.landmarks(trial.shape.map(({ name }) => values[name]!));
  const depthSigma = answer.parameters.find(({ name }) => name === 'edgeDepthNm')?.sigma ?? 0;
  const around = Math.floor(ROUND_EDGE / landmarks.length);
  const depths = new Set<number>();
  for (let k = 0; k <= EVEN; k++) depths.add(endNm * (k / EVEN));
  for (const { depthNm, widthNm } of landmarks) {
    const spreadNm = Math.max(4 * widthNm, 3 * depthSigma, endNm / 100);
    for (let k = -around; k <= around; k++) depths.add(depthNm + (spreadNm * k) / around);
  }
  const inside = [...depths].filter((depth) => depth >= 0 && depth <= endNm).sort((a, b) => a - b);
  return Float64Array.from(
    inside.filter((depth, k) => k === 0 || depth - inside[k - 1]! > 1e-9 * endNm),
  );
}
