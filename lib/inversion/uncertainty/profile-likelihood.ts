import { DELTA_CHI_SQUARE_68, DELTA_CHI_SQUARE_95 } from '../constants';
import { minimise, type MinimiseScratch } from '../fit/minimise';
import type { Model, Problem } from '../fit/model';
import { openWidths } from '../fit/widths';
import type { Covariance, Interval } from '../types';
import { sigmaOf } from './covariance';
import { findBracket, findRoot, type Line } from './find-end';
import { otherValleys } from './other-valleys';

export interface ProfileIntervals {
  interval68: Interval;
  interval95: Interval;
  /** A point with a lower Φ than the minimum handed in, found on the way: the fit has to start again from here. */
  better: Float64Array | null;
}

/** The minimum that intervals are measured from. */
export interface MinimumPoint {
  theta: Float64Array;
  chiSquare: number;
  covariance: Covariance;
  /** χ² of the nodes of the search. */
  nodeChiSquares: Float64Array;
}

/** Φ is corrected by what the last step promises, so that little is left of the tolerance. */
const INNER = { maxIterations: 200, tolerance: 1e-5, takeLastStep: true };
/** A fall of Φ by more than this is a new minimum, less is rounding. */
const NEW_MINIMUM = 1e-4;
/** A first step further than this share of the range would leave the valley of a poorly known parameter. */
const FIRST_SHARE = 1 / 8;

/**
 * Profile-likelihood intervals of parameter k: the values at which Φ, minimised over all other parameters within their
 * bounds, has risen by 1 (68 %) and 3.84 (95 %) (Wilks 1938; S. S. Wilks, Ann. Math. Stat. 9, 60). An end is null where Φ
 * never rises so far before the bound of the search; where that bound is the natural end of the parameter (a width of 0,
 * a fraction of 0 or 1, a rate without carriers) the interval ends there.
 */
export function profileIntervals(
  problem: Problem,
  scratch: MinimiseScratch,
  minimum: MinimumPoint,
  k: number,
): ProfileIntervals {
  const side = (direction: 1 | -1): Side => {
    const { crooked } = problem.model.trial;
    const walked = walkSide(problem, scratch, minimum, k, direction, crooked);
    return crooked || walked.better || !dipsBeyond(problem, minimum, k, direction, walked)
      ? walked
      : walkSide(problem, scratch, minimum, k, direction, true);
  };
  const down = side(-1);
  const up = side(1);
  return {
    interval68: [down.ends[0]!, up.ends[0]!],
    interval95: [down.ends[1]!, up.ends[1]!],
    better: down.better ?? up.better,
  };
}

interface Side {
  ends: (number | null)[];
  better: Float64Array | null;
}

function walkSide(
  problem: Problem,
  scratch: MinimiseScratch,
  minimum: MinimumPoint,
  k: number,
  direction: 1 | -1,
  crooked: boolean,
): Side {
  const { model } = problem;
  const bound = direction < 0 ? model.lower[k]! : model.upper[k]!;
  const closed = direction < 0 ? model.closedLower[k] : model.closedUpper[k];
  const naturalEnd = closed && Number.isFinite(bound) ? bound : null;
  const line = createLine(problem, scratch, minimum, k, crooked);
  const ends: (number | null)[] = [];
  let inside = { x: minimum.theta[k]!, rise: 0 };
  for (const target of [DELTA_CHI_SQUARE_68, DELTA_CHI_SQUARE_95]) {
    const bracket = findBracket(line, minimum.theta[k]!, inside, target, direction, bound);
    if (line.better) return { ends: [null, null], better: line.better };
    if (!bracket) {
      ends.push(naturalEnd);
      inside = { x: bound, rise: 0 };
      continue;
    }
    const root = findRoot(line, minimum.theta[k]!, bracket.inside, bracket.outside, target);
    // The last stretch is not walked but calculated, and may lead past the bound: then Φ does not rise so far before it.
    ends.push(direction * (root - bound) > 0 ? naturalEnd : root);
    inside = { x: root, rise: target };
  }
  return { ends, better: line.better };
}

/** Nodes of the search are folded on coarse bins: what they say is meant to this. */
const NODE_ACCURACY = 0.05;

/**
 * Whether the search has seen a lower Φ further out than an end that was found: the walk was then caught in one valley, or Φ falls
 * again. Levels and the depth scale are no axes of the search.
 */
function dipsBeyond(
  { model }: Problem,
  { chiSquare, nodeChiSquares }: MinimumPoint,
  k: number,
  direction: 1 | -1,
  { ends }: Side,
): boolean {
  const axis = model.grid.axes[k];
  if (!axis) return false;
  const stride = model.grid.axes.slice(0, k).reduce((product, { length }) => product * length, 1);
  return [DELTA_CHI_SQUARE_68, DELTA_CHI_SQUARE_95].some((target, at) => {
    const end = ends[at]!;
    if (end === null) return false;
    const limit = chiSquare + target - NODE_ACCURACY;
    return nodeChiSquares.some(
      (value, node) =>
        value < limit && direction * (axis[Math.floor(node / stride) % axis.length]! - end) > 0,
    );
  });
}

/** Φ profiled over everything but θ_k. Each minimisation begins at the last one, moved along the covariance. */
function createLine(
  problem: Problem,
  scratch: MinimiseScratch,
  { theta, chiSquare, covariance, nodeChiSquares }: MinimumPoint,
  k: number,
  crooked: boolean,
): Line {
  const { model } = problem;
  const held = Uint8Array.from(model.held);
  held[k] = 1;
  const point = Float64Array.from(theta);
  const slopes = slopesAlong(problem, covariance, k);
  const sigma = sigmaOf(covariance, model.names[k]!);
  // Where valleys are crooked each point is also reached from the minimum itself and from nodes of the search; the lowest counts.
  const afresh = crooked ? new Float64Array(model.size) : null;
  const valleys = afresh && otherValleys(problem, scratch, nodeChiSquares, held, k);
  const line: Line = {
    sigma,
    step: firstStep(problem, theta, sigma, k),
    better: null,
    rise(x) {
      moveTo(model, point, held, slopes, k, x);
      let rise = minimise(problem, point, held, scratch, INNER).chiSquare - chiSquare;
      if (afresh) {
        afresh.set(theta);
        moveTo(model, afresh, held, slopes, k, x);
        openWidths(model, afresh, held);
        const other = minimise(problem, afresh, held, scratch, INNER).chiSquare - chiSquare;
        if (other < rise) {
          rise = other;
          point.set(afresh);
        }
        if (valleys!(x, afresh) - chiSquare < rise) {
          const beside = minimise(problem, afresh, held, scratch, INNER).chiSquare - chiSquare;
          if (beside < rise) {
            rise = beside;
            point.set(afresh);
          }
        }
      }
      if (rise < -NEW_MINIMUM * (1 + chiSquare)) line.better = Float64Array.from(point);
      return Math.max(0, rise);
    },
  };
  return line;
}

/** θ_k to x and the others along the valley, within their bounds. */
function moveTo(
  { size, lower, upper }: Model,
  point: Float64Array,
  held: Uint8Array,
  slopes: Float64Array,
  k: number,
  x: number,
): void {
  const shift = x - point[k]!;
  for (let l = 0; l < size; l++) {
    if (held[l] || slopes[l] === 0) continue;
    point[l] = Math.min(Math.max(point[l]! + slopes[l]! * shift, lower[l]!), upper[l]!);
  }
  point[k] = x;
}

/** dθ_l/dθ_k along the valley of Φ: C_lk/C_kk. */
function slopesAlong({ model }: Problem, covariance: Covariance, k: number): Float64Array {
  const slopes = new Float64Array(model.size);
  if (!covariance.ok) return slopes;
  const at = covariance.names.indexOf(model.names[k]!);
  if (at < 0) return slopes;
  for (let l = 0; l < model.size; l++) {
    const other = covariance.names.indexOf(model.names[l]!);
    if (other >= 0 && l !== k)
      slopes[l] = covariance.matrix[at]![other]! / covariance.matrix[at]![at]!;
  }
  return slopes;
}

function firstStep(
  { model }: Problem,
  theta: Float64Array,
  sigma: number | null,
  k: number,
): number {
  const span = Number.isFinite(model.upper[k]!)
    ? model.upper[k]! - model.lower[k]!
    : Math.max(1, 2 * Math.abs(theta[k]!));
  return sigma === null ? span / 20 : Math.min(sigma, span * FIRST_SHARE);
}
