import type { PreparedFit } from '../fit/prepared-fit';
import { createRefit, expectedRows, linearStart, observe, refit } from '../fit/refit';
import { thetaOf, valuesOf } from '../fit/theta-of';
import { checkBlock, type SeededBlock } from '../simulate/check-block';
import { noiseOf } from '../simulate/draw-noise';
import { normalStream } from '../statistics/random';
import type { FitAnswer } from '../types';

export type ResampleBlock = SeededBlock;

/**
 * Parametric bootstrap: for each row new observations ŷ + N(0, V) and new prior means θ̂ + σ_prior·N(0, 1) are drawn and
 * the fit is made again, by the same global search. Row r depends only on (seed, first + r).
 *
 * @returns row-major count × free parameters, in the order of prepared.freeNames.
 * @throws InversionError for a seed, first or count that is not a whole number ≥ 0.
 */
export function resample(
  prepared: PreparedFit,
  answer: FitAnswer,
  block: ResampleBlock,
): Float64Array {
  checkBlock(block);
  const { model } = prepared.problem;
  const values = valuesOf(answer);
  const best = thetaOf(prepared, values);
  const expected = expectedRows(prepared, values);
  const again = createRefit(prepared);
  const start = linearStart(again, answer);
  const noise = noiseOf(prepared);
  const observed = new Float64Array(model.rowCount);
  const priorMean = Float64Array.from(prepared.problem.data.priorMean);
  const free = Array.from(model.names.keys()).filter((k) => !model.held[k]);
  const rows = new Float64Array(block.count * free.length);
  const theta = new Float64Array(model.size);
  for (let r = 0; r < block.count; r++) {
    const normal = normalStream(block.seed, block.first + r);
    noise(normal, observed);
    for (let i = 0; i < observed.length; i++) observed[i] = observed[i]! + expected[i]!;
    for (let k = 0; k < model.size; k++) {
      const inverse = model.priorInverseSigma[k]!;
      if (inverse > 0) priorMean[k] = best[k]! + normal() / inverse;
    }
    observe(again, observed, priorMean);
    theta.set(best);
    start?.(observed, priorMean, theta);
    refit(again, theta);
    for (let column = 0; column < free.length; column++)
      rows[r * free.length + column] = theta[free[column]!]!;
  }
  return rows;
}
