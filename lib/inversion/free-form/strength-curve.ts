import {
  createPenalisedWork,
  solveAtStrength,
  type CurvePoint,
  type PenalisedProblem,
  type PenalisedWork,
} from './penalised';

/** Strengths on the curve unless the caller gives his own. */
const GRID_POINTS = 40;
/** The strongest penalty leaves this much of a parameter beside what the penalty does not see. */
const LEFT_AT_TOP = 0.05;
/** Weakest strength over the strongest, at most: below this the system has no digits left. */
const WIDEST = 1e-14;

/**
 * Strengths µ in descending order, evenly spaced in ln µ: from where the penalty leaves only what it does not see (a constant,
 * a straight line) to where the data keep less than one degree of freedom, both measured without the constraint, by decades.
 */
export function strengthGrid(problem: PenalisedProblem, dataCount: number): Float64Array {
  const { design, penalty } = problem;
  const loose = { ...problem, nonNegative: false };
  const work = createPenalisedWork(loose, dataCount);
  const parametersAt = (strength: number): number => {
    solveAtStrength(loose, work, strength);
    return work.point.effectiveParameters;
  };
  const unseen = design.columns - penalty.rows;
  const most = Math.min(dataCount, design.columns) - 1;
  let top = squareSum(design.values) / squareSum(penalty.values);
  let bottom = top;
  // Dependent columns give NaN, which ends either walk.
  while (parametersAt(top) - unseen > LEFT_AT_TOP) top *= 10;
  if (top === bottom) while (parametersAt(top / 10) - unseen <= LEFT_AT_TOP) top /= 10;
  bottom = top / 10;
  while (bottom > WIDEST * top && parametersAt(bottom) < Math.max(most, unseen + LEFT_AT_TOP))
    bottom /= 10;
  return Float64Array.from(
    { length: GRID_POINTS },
    (_, k) => top * (bottom / top) ** (k / (GRID_POINTS - 1)),
  );
}

function squareSum(values: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i]! * values[i]!;
  return sum;
}

/**
 * χ², roughness, effective parameters and GCV at each strength, best given in descending order: each starts from the one
 * before.
 */
export function strengthCurve(
  problem: PenalisedProblem,
  work: PenalisedWork,
  strengths: ArrayLike<number>,
): CurvePoint[] {
  return Array.from(strengths, (strength) => {
    solveAtStrength(problem, work, strength);
    return { ...work.point };
  });
}
