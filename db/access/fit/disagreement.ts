import {
  AGREEMENT_TOLERANCE,
  type CarrierProfile,
  type Covariance,
  type FitAnswer,
  type FitParameter,
  type ProfilePoint,
} from '@/lib/inversion/index';

export interface Disagreement {
  /** Such as "σ of edgeDepthNm" or "upper95 at depth 40 nm". */
  what: string;
  claimed: Shown;
  recomputed: Shown;
}
type Shown = number | string | boolean | null;

interface Pair {
  what: string;
  claimed: Shown | undefined;
  recomputed: Shown | undefined;
  /** What counts as large for this number; differences are relative to it when it is larger. */
  scale?: number;
}

/**
 * The first number of a claimed answer that the recomputed one does not confirm, or null. Left out
 * is only the evidence of the search: how many steps were taken is no result, and the server keeps
 * its own count.
 */
export function firstDisagreement(
  claimed: { answer: FitAnswer; profile: CarrierProfile },
  recomputed: { answer: FitAnswer; profile: CarrierProfile },
): Disagreement | null {
  for (const pair of pairs(claimed, recomputed)) {
    if (agrees(pair)) continue;
    const { what, claimed: c = null, recomputed: r = null } = pair;
    return { what, claimed: c, recomputed: r };
  }
  return null;
}

function agrees({ claimed, recomputed, scale = 0 }: Pair): boolean {
  if (typeof claimed !== 'number' || typeof recomputed !== 'number') return claimed === recomputed;
  const size = Math.max(Math.abs(claimed), Math.abs(recomputed), scale);
  return Math.abs(claimed - recomputed) <= AGREEMENT_TOLERANCE * size;
}

function* pairs(
  claimed: { answer: FitAnswer; profile: CarrierProfile },
  recomputed: { answer: FitAnswer; profile: CarrierProfile },
): Generator<Pair> {
  yield* parameterPairs(claimed.answer, recomputed.answer);
  yield* statisticPairs(claimed.answer, recomputed.answer);
  yield* residualPairs(claimed.answer, recomputed.answer);
  yield* covariancePairs(claimed.answer.covariance, recomputed.answer.covariance);
  yield* profilePairs(claimed.profile, recomputed.profile, jumpOf(recomputed.answer));
}

/**
 * Where a sharp profile jumps. A depth on the jump itself may fall to either side by the last bit
 * of the edge, so that its value says nothing there; its bands do.
 */
function jumpOf({ parameters }: FitAnswer): (depthNm: number) => boolean {
  const named = (name: string) => parameters.find((parameter) => parameter.name === name);
  const edge = named('edgeDepthNm');
  if (edge === undefined || (named('edgeWidthNm')?.value ?? 0) > 0) return () => false;
  const size = Math.max(Math.abs(edge.value), edge.sigma ?? 0);
  return (depthNm) => Math.abs(depthNm - edge.value) <= AGREEMENT_TOLERANCE * size;
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

const COLUMNS = ['value', 'lower68', 'upper68', 'lower95', 'upper95'] as const;

function* profilePairs(
  claimed: CarrierProfile,
  recomputed: CarrierProfile,
  isJump: (depthNm: number) => boolean,
): Generator<Pair> {
  yield { what: 'unit of the profile', claimed: claimed.unit, recomputed: recomputed.unit };
  yield { what: 'kind of the bands', claimed: claimed.bands, recomputed: recomputed.bands };
  yield { what: 'reach', claimed: claimed.reachNm, recomputed: recomputed.reachNm };
  yield { what: 'floor', claimed: claimed.floor, recomputed: recomputed.floor };
  yield counted('number of depths', claimed.points, recomputed.points);
  const scales = Object.fromEntries(
    COLUMNS.map((column) => [column, largest(recomputed.points, column)]),
  );
  for (const [index, ours] of recomputed.points.entries()) {
    const theirs = claimed.points[index];
    const at = `at depth ${ours.depthNm} nm`;
    yield { what: `depth ${index + 1}`, claimed: theirs?.depthNm, recomputed: ours.depthNm };
    const jumps = isJump(ours.depthNm);
    for (const column of COLUMNS) {
      if (jumps && column === 'value') continue;
      yield {
        what: `${column} ${at}`,
        claimed: theirs?.[column],
        recomputed: ours[column],
        scale: scales[column],
      };
    }
    if (!jumps) yield { what: `flag ${at}`, claimed: theirs?.flag, recomputed: ours.flag };
  }
}

function largest(points: readonly ProfilePoint[], column: (typeof COLUMNS)[number]): number {
  return points.reduce((most, point) => Math.max(most, Math.abs(point[column] ?? 0)), 0);
}

function counted(what: string, claimed: readonly unknown[], recomputed: readonly unknown[]): Pair {
  return { what, claimed: claimed.length, recomputed: recomputed.length };
}
