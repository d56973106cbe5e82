import { checkBlock, type SeededBlock } from '../simulate/check-block';
import { normalStream } from '../statistics/random';
import { compileProblem } from './compile-problem';
import type { Monotonic } from './free-form-input';
import { fromSteps, observeAt, toSteps, whitenData, whitenDesign } from './observation';
import { createPenalisedWork, solveAtStrength } from './penalised';
import type { PreparedFreeForm } from './prepare-free-form';
import type { FreeFormSolution } from './solve-free-form';

/** Depth scales beyond a factor of two are no error of a stopping calculation; a draw never comes near. */
const SCALE_ENDS = [0.5, 2] as const;

/**
 * Resamples at the strength of the solution: for each row noise of covariance V is added to the observations (and to the prior
 * mean of a free cap level) and the profile is found again; where the depth scale is not held it is drawn from its prior and
 * the folds are made again. The noise goes on the observations and not on ŷ: ŷ is smoothed already, and finding it again would
 * smooth twice and leave the profile at the edge of its own band. The rows tell what noise and depth scale do to a profile as
 * smooth as this one. They do not hold what smoothing itself takes away: an edge sharper than the resolution looks equally
 * rounded in every row, so a band must be read beside the averaging kernels. Row r depends only on (seed, first + r).
 *
 * @returns row-major count × unknowns: u per knot, then the cap level where it is free; NaN in a row that could not be solved.
 * @throws InversionError 'bad-block'.
 */
export function resampleFreeForm(
  prepared: PreparedFreeForm,
  solution: Pick<FreeFormSolution, 'unknowns' | 'levelCap' | 'strength'>,
  block: SeededBlock,
): Float64Array {
  checkBlock(block);
  const { input, observation, whitener, pointOfRow, knotsNm, scale, scalePrior } = prepared;
  const { design, problem } = compileProblem(input, observation, whitener, scale, pointOfRow);
  const knots = knotsNm.length;
  const { rows, columns } = design;
  const y = Float64Array.from(pointOfRow, (point) => input.points[point]!.value);
  const start = stepsOf(solution, columns, input.monotonic);
  const work = createPenalisedWork(problem, prepared.dataCount);
  const answer = new Float64Array(block.count * columns);
  const u = new Float64Array(columns);
  for (let r = 0; r < block.count; r++) {
    const normal = normalStream(block.seed, block.first + r);
    if (scalePrior) {
      const drawn = scalePrior.mean + scalePrior.sigma * normal();
      observeAt(observation, Math.min(Math.max(drawn, SCALE_ENDS[0]), SCALE_ENDS[1]));
      whitenDesign(observation, whitener, problem.design);
      toSteps(problem.design, knots, input.monotonic);
    }
    whitenData(observation, whitener, y, problem.data);
    // Whitened noise is N(0, 1) whatever V; a row past the points is the prior of the cap level.
    for (let i = 0; i < rows; i++) {
      if (i >= pointOfRow.length || whitener.inverseSigma[i]! > 0)
        problem.data[i] = problem.data[i]! + normal();
    }
    work.state.x.set(start);
    solveAtStrength(problem, work, solution.strength);
    if (work.status === 'solved') fromSteps(work.state.x, knots, input.monotonic, u);
    else u.fill(NaN);
    answer.set(u, r * columns);
  }
  observeAt(observation, scale);
  return answer;
}

/** d ≥ 0 with C·d = u, where each solve starts. */
function stepsOf(
  { unknowns: u, levelCap }: Pick<FreeFormSolution, 'unknowns' | 'levelCap'>,
  columns: number,
  way: Monotonic,
): Float64Array {
  const d = new Float64Array(columns);
  d.set(u);
  if (levelCap !== null) d[u.length] = levelCap;
  if (way === 'rising') for (let j = 1; j < u.length; j++) d[j] = Math.max(0, u[j]! - u[j - 1]!);
  if (way === 'falling')
    for (let j = 0; j < u.length - 1; j++) d[j] = Math.max(0, u[j]! - u[j + 1]!);
  return d;
}
