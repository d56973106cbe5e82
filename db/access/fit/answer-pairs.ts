import type { Covariance, FitAnswer, FitParameter } from '@/lib/inversion/index';

import { counted, type Pair, type Shown } from './pair';

/**
 * Every number of an answer. Left out is only the evidence of the search: how many steps were taken
 * is no result, and the server keeps its own count.
 */
export function* answerPairs(claimed: FitAnswer, recomputed: FitAnswer): Generator<Pair> {
  yield* parameterPairs(claimed, recomputed);
  yield* statisticPairs(claimed, recomputed);
  yield* residualPairs(claimed, recomputed);
  yield* covariancePairs(claimed.covariance, recomputed.covariance);
}

function* parameterPairs(claimed: FitAnswer, recomputed: FitAnswer): Generator<Pair> {
  yield counted('number of parameters', claimed.parameters, recomputed.parameters);
  for (const [index, ours] of recomputed.parameters.entries()) {
    const theirs: Partial<FitParameter> = claimed.parameters[index] ?? {};
    const { name } = ours;
    const scale = ours.sigma ?? 0;
    const pair = (what: string, of: (p: Partial<FitParameter>) => Shown | undefined): Pair => ({
      what: what === '' ? name : `${what} of ${name}`,
      claimed: of(theirs),
      recomputed: of(ours),
      scale,
    });
    yield pair('name', (p) => p.name);
    yield pair('', (p) => p.value);
    yield pair('σ', (p) => p.sigma);
    yield pair('lower end of the 68 % interval', (p) => p.interval68?.[0]);
    yield pair('upper end of the 68 % interval', (p) => p.interval68?.[1]);
    yield pair('lower end of the 95 % interval', (p) => p.interval95?.[0]);
    yield pair('upper end of the 95 % interval', (p) => p.interval95?.[1]);
    yield pair('hold', (p) => p.held);
    yield pair('bound', (p) => p.atBound);
    yield pair('symmetry', (p) => p.symmetric);
  }
}

function* statisticPairs(claimed: FitAnswer, recomputed: FitAnswer): Generator<Pair> {
  const pair = (what: string, of: (answer: FitAnswer) => Shown, scale = 0): Pair => ({
    what,
    claimed: of(claimed),
    recomputed: of(recomputed),
    scale,
  });
  yield pair('status', (answer) => answer.status);
  // χ² near zero is a sum of rounding errors: one is what a single point adds by chance.
  yield pair('χ²', (answer) => answer.chiSquare, 1);
  yield pair('χ² of the data', (answer) => answer.dataChiSquare, 1);
  yield pair('degrees of freedom', (answer) => answer.degreesOfFreedom);
  yield pair('p-value', (answer) => answer.pValue);
  yield pair('number of free parameters', (answer) => answer.freeParameters);
  yield pair('AICc', (answer) => answer.aicc, 1);
  yield pair('BIC', (answer) => answer.bic, 1);
}

function* residualPairs(claimed: FitAnswer, recomputed: FitAnswer): Generator<Pair> {
  yield counted('number of residuals', claimed.residuals, recomputed.residuals);
  for (const [index, ours] of recomputed.residuals.entries()) {
    const theirs = claimed.residuals[index];
    const at = `at ${ours.energyKeV} keV`;
    const scale = ours.sigma;
    yield { what: `energy ${at}`, claimed: theirs?.energyKeV, recomputed: ours.energyKeV };
    yield { what: `value ${at}`, claimed: theirs?.observed, recomputed: ours.observed, scale };
    yield { what: `σ ${at}`, claimed: theirs?.sigma, recomputed: ours.sigma };
    yield {
      what: `prediction ${at}`,
      claimed: theirs?.predicted,
      recomputed: ours.predicted,
      scale,
    };
    yield { what: `residual ${at}`, claimed: theirs?.reduced, recomputed: ours.reduced, scale: 1 };
    yield { what: `use of the point ${at}`, claimed: theirs?.enabled, recomputed: ours.enabled };
    yield {
      what: `interpolation ${at}`,
      claimed: theirs?.interpolated,
      recomputed: ours.interpolated,
    };
  }
}

function* covariancePairs(claimed: Covariance, recomputed: Covariance): Generator<Pair> {
  yield { what: 'existence of the covariance', claimed: claimed.ok, recomputed: recomputed.ok };
  if (!claimed.ok || !recomputed.ok) return;
  yield {
    what: 'names of the covariance',
    claimed: claimed.names.join(', '),
    recomputed: recomputed.names.join(', '),
  };
  yield counted('rows of the covariance', claimed.matrix, recomputed.matrix);
  for (const [i, rowName] of recomputed.names.entries()) {
    for (const [j, columnName] of recomputed.names.entries()) {
      const pairOf = `of ${rowName} and ${columnName}`;
      yield {
        what: `covariance ${pairOf}`,
        claimed: claimed.matrix[i]?.[j],
        recomputed: recomputed.matrix[i]?.[j],
        scale: Math.sqrt((recomputed.matrix[i]?.[i] ?? 0) * (recomputed.matrix[j]?.[j] ?? 0)),
      };
      yield {
        what: `correlation ${pairOf}`,
        claimed: claimed.correlation[i]?.[j],
        recomputed: recomputed.correlation[i]?.[j],
        scale: 1,
      };
    }
  }
}
