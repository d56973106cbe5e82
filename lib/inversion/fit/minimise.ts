import type { EdgeParameters } from '../profile/trial-profile';
import { evaluate } from './evaluate';
import { minimiseOnLine } from './minimise-on-line';
import type { Problem } from './model';
import { openings } from './widths';
import { refine, type RefineOptions, type RefineResult, type RefineScratch } from './refine';

/** Two steps are minimised in turn, each with the other at rest, at most this often. */
const MOST_SWEEPS = 8;
const ROUNDING = 1e-9;

export interface MinimiseScratch {
  refine: RefineScratch;
  inner: Float64Array;
  innerHeld: Uint8Array;
}

/**
 * Local minimum of Φ over everything not held, θ improved in place. Where the trial profile is smooth, refine alone does it.
 * For a step (a sharp edge, or a graded one whose width came to rest at zero) Φ has kinks where the edge crosses a bin border;
 * there the edge is minimised on a line with everything else re-optimised at each step.
 */
export function minimise(
  problem: Problem,
  theta: Float64Array,
  held: Uint8Array,
  scratch: MinimiseScratch,
  options: RefineOptions,
): RefineResult {
  const { trial } = problem.model;
  const result = refine(problem, theta, held, scratch.refine, options);
  if (trial.kinked) return minimiseSteps(problem, theta, held, scratch, options, result);
  if (!trial.edges.some(({ width }) => width !== null && theta[width] === 0)) return result;
  const opened = leaveZeroWidth(problem, theta, held, scratch, options, result);
  return opened ?? minimiseSteps(problem, theta, held, scratch, options, result);
}

/** Brent's minimiser over each step within two bins of where refine stopped; zero widths stay, the rest follows. */
function minimiseSteps(
  problem: Problem,
  theta: Float64Array,
  held: Uint8Array,
  scratch: MinimiseScratch,
  options: RefineOptions,
  result: RefineResult,
): RefineResult {
  const { edges } = problem.model.trial;
  const steps = edges.filter((edge) => isStep(edge, theta) && moverOf(edge, held) >= 0);
  let { chiSquare } = result;
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    const before = chiSquare;
    for (const step of steps)
      chiSquare = minimiseStep(problem, theta, held, scratch, options, step, chiSquare);
    if (steps.length < 2 || before - chiSquare <= options.tolerance * (1 + chiSquare)) break;
  }
  evaluate(problem, theta, held);
  if (steps.length === 0) return result;
  return { chiSquare, iterations: result.iterations, converged: true, predictedReduction: 0 };
}

/** The parameter that moves an edge: the last of its position that is not held; -1 where all are. */
function moverOf({ position }: EdgeParameters, held: Uint8Array): number {
  for (let a = position.length - 1; a >= 0; a--) if (!held[position[a]!]) return position[a]!;
  return -1;
}

function isStep({ width }: EdgeParameters, theta: Float64Array): boolean {
  return width === null || theta[width] === 0;
}

/** Φ is a parabola at its bottom: a line is meant to the square root of what Φ may still fall by, as a share of the range. */
function lineTolerance({ tolerance }: RefineOptions): number {
  return Math.min(1e-5, Math.max(1e-9, 0.003 * Math.sqrt(tolerance)));
}

function minimiseStep(
  problem: Problem,
  theta: Float64Array,
  held: Uint8Array,
  { refine: refineScratch, inner, innerHeld }: MinimiseScratch,
  options: RefineOptions,
  step: EdgeParameters,
  chiSquare: number,
): number {
  const { model } = problem;
  const { edges } = model.trial;
  const moved = moverOf(step, held);
  // An edge that is placed from this one stays where it is and takes the move back, unless it is held.
  const follower =
    edges.find((edge) => edge !== step && edge.position.includes(moved))?.position.at(-1) ?? -1;
  const counter = follower >= 0 && follower !== moved && !held[follower] ? follower : -1;
  innerHeld.set(held);
  for (const edge of edges) {
    if (!isStep(edge, theta)) continue;
    const mover = moverOf(edge, held);
    if (mover >= 0) innerHeld[mover] = 1;
    if (edge.width !== null) innerHeld[edge.width] = 1;
  }
  innerHeld[moved] = 1;
  inner.set(theta);
  let linear = true;
  for (let k = 0; k < model.size; k++) {
    const level = k >= model.shapeCount && k < model.scaleIndex;
    if (!level && !innerHeld[k]) linear = false;
  }
  const place = theta[moved]!;
  const followed = counter < 0 ? 0 : theta[counter]!;
  const at = (value: number): number => {
    inner[moved] = value;
    if (counter >= 0) inner[counter] = followed - (value - place);
    return linear
      ? evaluate(problem, inner, innerHeld)
      : refine(problem, inner, innerHeld, refineScratch, options).chiSquare;
  };
  const span = 2 * binWidthAt(problem, theta, step);
  const highest = counter < 0 ? Infinity : place + followed - model.lower[counter]!;
  const best = minimiseOnLine(
    at,
    Math.max(model.lower[moved]!, place - span),
    place,
    Math.min(model.upper[moved]!, place + span, highest),
    lineTolerance(options) * model.upper[moved]!,
  );
  if (!(best.value < chiSquare)) return chiSquare;
  const reached = at(best.x);
  theta.set(inner);
  return reached;
}

/**
 * A width that came to rest at zero may have to leave again: Φ has no slope there. Where the other parameters are at their
 * best, the change of their minimum with a small width is the change at fixed others (envelope theorem), so a few widths are
 * tried as they stand, and the best is followed if it lies lower. Null where none does.
 */
function leaveZeroWidth(
  problem: Problem,
  theta: Float64Array,
  held: Uint8Array,
  { refine: scratch, inner }: MinimiseScratch,
  options: RefineOptions,
  result: RefineResult,
): RefineResult | null {
  const { widths, upper } = problem.model;
  let lowest = result.chiSquare;
  let width = -1;
  let opened = 0;
  for (const k of widths) {
    if (held[k] || theta[k]! > 0) continue;
    for (const share of openings(problem.model)) {
      inner.set(theta);
      inner[k] = share * upper[k]!;
      const chiSquare = evaluate(problem, inner, held);
      // Within a bin Φ is flat in the width: what is less than rounding opens nothing.
      if (!(chiSquare < lowest - ROUNDING * (1 + lowest))) continue;
      lowest = chiSquare;
      width = k;
      opened = share * upper[k]!;
    }
  }
  if (width < 0) return null;
  theta[width] = opened;
  const followed = refine(problem, theta, held, scratch, options);
  return { ...followed, iterations: followed.iterations + result.iterations };
}

/** Widest bin round an edge, in depths of the profile. */
function binWidthAt({ model }: Problem, theta: Float64Array, { position }: EdgeParameters): number {
  const scale = theta[model.scaleIndex]!;
  const depth = position.reduce((sum, k) => sum + theta[k]!, 0);
  const u = (depth + model.capNm) / scale;
  let widest = 0;
  for (const { edgesNm } of model.kernel.groups) {
    let j = 1;
    while (j < edgesNm.length - 1 && edgesNm[j]! < u) j++;
    widest = Math.max(widest, edgesNm[j]! - edgesNm[j - 1]!);
  }
  return widest * scale;
}
