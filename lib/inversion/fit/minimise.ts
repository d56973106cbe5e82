import { evaluate } from './evaluate';
import { minimiseOnLine } from './minimise-on-line';
import type { Problem } from './model';
import { OPENED_WIDTHS } from './widths';
import { refine, type RefineOptions, type RefineResult, type RefineScratch } from './refine';

/** Index of the edge whose borders χ² has kinks at. */
const EDGE = 0;

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
  const { kinked, widths } = problem.model.trial;
  const result = refine(problem, theta, held, scratch.refine, options);
  if (kinked) return minimiseStep(problem, theta, held, scratch, options, result);
  if (!widths.some((k) => theta[k] === 0 && !held[k])) return result;
  const opened = leaveZeroWidth(problem, theta, held, scratch, options, result);
  return opened ?? minimiseStep(problem, theta, held, scratch, options, result);
}

/** Brent's minimiser over the edge within two bins of where refine stopped; widths stay, the rest follows. */
function minimiseStep(
  problem: Problem,
  theta: Float64Array,
  held: Uint8Array,
  scratch: MinimiseScratch,
  options: RefineOptions,
  result: RefineResult,
): RefineResult {
  const { model } = problem;
  if (held[EDGE]) {
    evaluate(problem, theta, held);
    return result;
  }
  const { inner, innerHeld } = scratch;
  innerHeld.set(held);
  innerHeld[EDGE] = 1;
  for (const k of model.trial.widths) innerHeld[k] = 1;
  inner.set(theta);
  const linear = held[model.scaleIndex] === 1;
  const at = (edgeNm: number): number => {
    inner[EDGE] = edgeNm;
    return linear
      ? evaluate(problem, inner, innerHeld)
      : refine(problem, inner, innerHeld, scratch.refine, options).chiSquare;
  };
  const span = 2 * binWidthAt(problem, theta);
  const best = minimiseOnLine(
    at,
    Math.max(model.lower[EDGE]!, theta[EDGE]! - span),
    theta[EDGE]!,
    Math.min(model.upper[EDGE]!, theta[EDGE]! + span),
    Math.min(1e-5, Math.max(1e-9, options.tolerance)) * model.upper[EDGE]!,
  );
  let { chiSquare } = result;
  if (best.value < chiSquare) {
    chiSquare = at(best.x);
    theta.set(inner);
  }
  evaluate(problem, theta, held);
  return { chiSquare, iterations: result.iterations, converged: true, predictedReduction: 0 };
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
  const { trial, upper } = problem.model;
  let lowest = result.chiSquare;
  let width = -1;
  let opened = 0;
  for (const k of trial.widths) {
    if (held[k] || theta[k]! > 0) continue;
    for (const share of OPENED_WIDTHS) {
      inner.set(theta);
      inner[k] = share * upper[k]!;
      const chiSquare = evaluate(problem, inner, held);
      if (chiSquare >= lowest) continue;
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

export interface MinimiseScratch {
  refine: RefineScratch;
  inner: Float64Array;
  innerHeld: Uint8Array;
}

/** Widest bin round the edge, in depths of the profile. */
function binWidthAt({ model }: Problem, theta: Float64Array): number {
  const scale = theta[model.scaleIndex]!;
  const u = (theta[EDGE]! + model.capNm) / scale;
  let widest = 0;
  for (const { edgesNm } of model.kernel.groups) {
    let j = 1;
    while (j < edgesNm.length - 1 && edgesNm[j]! < u) j++;
    widest = Math.max(widest, edgesNm[j]! - edgesNm[j - 1]!);
  }
  return widest * scale;
}
