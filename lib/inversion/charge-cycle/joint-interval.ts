import { createNormalEquations } from '../fit/normal-equations';
import type { Interval } from '../types';
import { fillNormal, polishJoint, type JointMinimum } from './joint-polish';
import { whiten, type JointProblem } from './joint-problem';

/** Δχ² is met to this. */
const CLOSE = 1e-4;
const MOST_STEPS = 60;

export interface JointInterval {
  interval: Interval;
  /** A lower minimum met on the way. */
  better: Float64Array | null;
}

/**
 * Profile-likelihood interval of parameter k of θ: where χ², minimised over everything else, has risen by `rise`. One side
 * is null where χ² does not rise so far before the parameter reaches its bound.
 */
export function jointInterval(
  problem: JointProblem,
  minimum: JointMinimum,
  k: number,
  rise: number,
): JointInterval {
  const down = walkOut(problem, minimum, k, rise, -1);
  const up = walkOut(problem, minimum, k, rise, 1);
  return { interval: [down.at, up.at], better: down.better ?? up.better };
}

function walkOut(
  problem: JointProblem,
  minimum: JointMinimum,
  k: number,
  rise: number,
  direction: 1 | -1,
): { at: number | null; better: Float64Array | null } {
  const bound = direction < 0 ? problem.lower[k]! : problem.upper[k]!;
  const start = minimum.theta[k]!;
  if (start === bound) return { at: null, better: null };
  const held = Uint8Array.from(problem.held);
  held[k] = 1;
  let warm = minimum.theta;
  let better: Float64Array | null = null;
  // √Δχ² is close to linear in the distance: its crossing is what is sought.
  const rootAt = (value: number): number => {
    const theta = Float64Array.from(warm);
    theta[k] = value;
    const profile = polishJoint(problem, theta, held);
    if (profile.chiSquare < minimum.chiSquare - CLOSE) better = profile.theta;
    else warm = profile.theta;
    return Math.sqrt(Math.max(0, profile.chiSquare - minimum.chiSquare));
  };
  const wanted = Math.sqrt(rise);
  let near = { distance: 0, root: 0 };
  let far = { distance: wanted * firstStep(problem, minimum.theta, k), root: 0 };
  const room = Math.abs(bound - start);
  for (let step = 0; step < MOST_STEPS && !better; step++) {
    far.distance = Math.min(far.distance, room);
    far.root = rootAt(start + direction * far.distance);
    if (far.root >= wanted) break;
    if (far.distance >= room) return { at: null, better };
    near = far;
    far = { distance: far.distance * 2, root: 0 };
  }
  for (let step = 0; step < MOST_STEPS && !better; step++) {
    if (Math.abs(far.root * far.root - rise) < CLOSE * rise) break;
    const share = (wanted - near.root) / (far.root - near.root);
    const kept = Math.min(Math.max(share, 0.02), 0.98);
    const distance = near.distance + kept * (far.distance - near.distance);
    const middle = { distance, root: rootAt(start + direction * distance) };
    if (Math.abs(middle.root * middle.root - rise) < CLOSE * rise) far = middle;
    else if (middle.root >= wanted) far = middle;
    else near = middle;
  }
  return { at: better ? null : start + direction * far.distance, better };
}

/** σ of the parameter with all others kept still, doubled: correlations widen it. */
function firstStep(problem: JointProblem, theta: Float64Array, k: number): number {
  const normal = createNormalEquations(problem.size);
  fillNormal(problem, whiten(problem, theta), normal);
  const curvature = normal.matrix[k * problem.size + k]!;
  return curvature > 0 ? 2 / Math.sqrt(curvature) : Math.max(Math.abs(theta[k]!), 1);
}
