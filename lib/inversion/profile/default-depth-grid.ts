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
  const edge = answer.parameters.find(({ name }) => name === 'edgeDepthNm')!;
  const spreadNm = Math.max(4 * (values.edgeWidthNm ?? 0), 3 * (edge.sigma ?? 0), endNm / 100);
  const depths = new Set<number>();
  for (let k = 0; k <= EVEN; k++) depths.add((endNm * k) / EVEN);
  for (let k = -ROUND_EDGE; k <= ROUND_EDGE; k++)
    depths.add(edge.value + (spreadNm * k) / ROUND_EDGE);
  const inside = [...depths].filter((depth) => depth >= 0 && depth <= endNm).sort((a, b) => a - b);
  return Float64Array.from(
    inside.filter((depth, k) => k === 0 || depth - inside[k - 1]! > 1e-9 * endNm),
  );
}
