import { InversionError } from '../errors';
import { evaluate, foldAt, meanLevel, predictFromFold } from '../fit/evaluate';
import { minimise } from '../fit/minimise';
import type { Problem } from '../fit/model';
import type { PreparedFit } from '../fit/prepared-fit';
import { inValleyOf, localMinima, scanGrid, thetaOfNode } from '../fit/search';
import { openWidths } from '../fit/widths';
import { thetaOf, valuesOf } from '../fit/theta-of';
import { normalStream } from '../statistics/random';
import type { FitAnswer } from '../types';

/** Another valley of the search is followed when its node lies less than this above the bottom found. */
const LOOK_AGAIN = 4;

export interface ResampleBlock {
  seed: number;
  /** Number of the first row, and how many rows. */
  first: number;
  count: number;
}

/** What Φ may still fall by, relative: a thousandth of a σ in any parameter. */
const TOLERANCE = 1e-7;

/**
 * Parametric bootstrap: for each row new observations ŷ + σ·N(0, 1) and new prior means θ̂ + σ_prior·N(0, 1) are drawn and
 * the fit is made again, by the same global search. Row r depends only on (seed, first + r).
 *
 * @returns row-major count × free parameters, in the order of prepared.freeNames.
 * @throws InversionError for a seed, first or count that is not a whole number ≥ 0.
 */
export function resample(
  prepared: PreparedFit,
  answer: FitAnswer,
  { seed, first, count }: ResampleBlock,
): Float64Array {
  for (const [name, value] of Object.entries({ seed, first, count })) {
    if (!(Number.isSafeInteger(value) && value >= 0)) {
      throw new InversionError(
        'bad-block',
        `A block of resamples needs a whole ${name} of 0 or more, not ${value}.`,
      );
    }
  }
  const { problem, scratch } = prepared;
  const { model } = problem;
  const best = thetaOf(prepared, valuesOf(answer));
  foldAt(model, problem.work, best);
  predictFromFold(model, problem.work, best);
  const predicted = Float64Array.from(problem.work.predicted);
  const drawn: Problem = {
    ...problem,
    data: {
      ...problem.data,
      y: Float64Array.from(problem.data.y),
      priorMean: Float64Array.from(problem.data.priorMean),
    },
  };
  const free = Array.from(model.names.keys()).filter((k) => !model.held[k]);
  const rows = new Float64Array(count * free.length);
  const chiSquares = new Float64Array(model.grid.nodeCount);
  const theta = new Float64Array(model.size);
  const other = new Float64Array(model.size);
  const options = { maxIterations: 60, tolerance: TOLERANCE };
  for (let r = 0; r < count; r++) {
    draw(drawn, problem, predicted, best, normalStream(seed, first + r));
    theta.set(best);
    openWidths(model, theta, model.held);
    let chiSquare = minimise(drawn, theta, model.held, scratch, options).chiSquare;
    scanGrid(drawn, model.neutral, model.held, chiSquares);
    for (const node of localMinima(model.grid.lattice, chiSquares).slice(0, 2)) {
      if (chiSquares[node]! > chiSquare + LOOK_AGAIN) break;
      if (chiSquares[node]! >= chiSquare && inValleyOf(model, node, theta)) continue;
      thetaOfNode(model, node, model.neutral, other);
      openWidths(model, other, model.held);
      const next = minimise(drawn, other, model.held, scratch, options).chiSquare;
      if (next < chiSquare) {
        chiSquare = next;
        theta.set(other);
      }
    }
    free.forEach((k, column) => {
      rows[r * free.length + column] = theta[k]!;
    });
  }
  evaluate(problem, best, model.held);
  return rows;
}

function draw(
  drawn: Problem,
  { data, model }: Problem,
  predicted: Float64Array,
  best: Float64Array,
  normal: () => number,
): void {
  for (let i = 0; i < model.rowCount; i++) {
    const inverse = data.inverseSigma[i]!;
    if (inverse > 0) drawn.data.y[i] = predicted[i]! + normal() / inverse;
  }
  for (let k = 0; k < model.size; k++) {
    const inverse = model.priorInverseSigma[k]!;
    if (inverse > 0) drawn.data.priorMean[k] = best[k]! + normal() / inverse;
  }
  drawn.fallback = meanLevel(drawn.data);
}
