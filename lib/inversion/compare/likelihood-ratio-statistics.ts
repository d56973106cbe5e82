import { createRefit, expectedRows, observe, refit } from '../fit/refit';
import type { PreparedFit } from '../fit/prepared-fit';
import { thetaOf, valuesOf } from '../fit/theta-of';
import { checkBlock, type SeededBlock } from '../simulate/check-block';
import { noiseOf } from '../simulate/draw-noise';
import { normalStream } from '../statistics/random';
import type { ParameterName, ParameterValues } from '../types';
import { checkNested, type NestedFits } from './nested-fits';

/** What the scans are drawn from: a trial profile, prepared on the same points, and its values. */
export interface Truth {
  prepared: PreparedFit;
  values: ParameterValues;
}

/**
 * max(0, χ²_simpler − χ²_richer) of scans drawn from a truth, each fitted by both. The points are drawn with their σ or their
 * full covariance. The mean of a prior is drawn about the true value of its parameter; where the truth does not have the
 * parameter (the prior of a width, under a sharp truth) it stays. Row r depends on (seed, r) alone.
 */
export function likelihoodRatioStatistics(
  nested: NestedFits,
  truth: Truth,
  block: SeededBlock,
): Float64Array {
  checkNested(nested);
  checkBlock(block);
  const draw = scanDrawer(nested, truth);
  const statistic = pairFitter(nested);
  return Float64Array.from({ length: block.count }, (_, r) =>
    statistic(draw(normalStream(block.seed, block.first + r))),
  );
}

/** Whitened observations by row of the model, the same for two fits of one scan, and the means of the priors by name. */
interface DrawnScan {
  rows: Float64Array;
  priorMeans: ParameterValues;
}

function scanDrawer({ richer }: NestedFits, truth: Truth): (normal: () => number) => DrawnScan {
  const expected = expectedRows(truth.prepared, truth.values);
  const noise = noiseOf(richer.prepared);
  const { names, priorInverseSigma } = richer.prepared.problem.model;
  const rows = new Float64Array(expected.length);
  return (normal) => {
    noise(normal, rows);
    for (let i = 0; i < rows.length; i++) rows[i] = rows[i]! + expected[i]!;
    const priorMeans: ParameterValues = {};
    names.forEach((name, k) => {
      const value = truth.values[name];
      if (priorInverseSigma[k]! > 0 && value !== undefined)
        priorMeans[name] = value + normal() / priorInverseSigma[k]!;
    });
    return { rows, priorMeans };
  };
}

/** Fits the simpler and then, from its minimum, the richer: so the richer one is never left higher by its search. */
function pairFitter({ simpler, richer }: NestedFits): (scan: DrawnScan) => number {
  const simple = modelFitter(simpler.prepared);
  const rich = modelFitter(richer.prepared);
  const simplerBest = thetaOf(simpler.prepared, valuesOf(simpler.answer));
  const richerBest = thetaOf(richer.prepared, valuesOf(richer.answer));
  const simplerTheta = new Float64Array(simplerBest.length);
  const richerTheta = new Float64Array(richerBest.length);
  const shared = simpler.prepared.parameterNames.map((name) =>
    richer.prepared.parameterNames.indexOf(name),
  );
  return (scan) => {
    simplerTheta.set(simplerBest);
    const simplerChiSquare = simple(scan, simplerTheta);
    richerTheta.set(richerBest);
    shared.forEach((k, j) => {
      richerTheta[k] = simplerTheta[j]!;
    });
    return Math.max(0, simplerChiSquare - rich(scan, richerTheta));
  };
}

function modelFitter(prepared: PreparedFit): (scan: DrawnScan, theta: Float64Array) => number {
  const again = createRefit(prepared);
  const { names } = prepared.problem.model;
  const priorMean = Float64Array.from(prepared.problem.data.priorMean);
  const asStated = Float64Array.from(priorMean);
  return ({ rows, priorMeans }, theta) => {
    names.forEach((name: ParameterName, k) => {
      priorMean[k] = priorMeans[name] ?? asStated[k]!;
    });
    observe(again, rows, priorMean);
    return refit(again, theta);
  };
}
