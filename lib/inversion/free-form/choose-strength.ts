import { minimiseOnLine } from '../fit/minimise-on-line';
import {
  solveAtStrength,
  type CurvePoint,
  type PenalisedProblem,
  type PenalisedWork,
} from './penalised';

/** A strength that a rule chose, or none; the note says what a reader should know of it. */
export interface StrengthChoice {
  strength: number | null;
  note: string | null;
}

export interface StrengthChoices {
  discrepancy: StrengthChoice;
  gcv: StrengthChoice;
  corner: StrengthChoice;
}

/** All three rules on one curve (strengths descending, or ascending). */
export function chooseStrength(
  problem: PenalisedProblem,
  work: PenalisedWork,
  curve: readonly CurvePoint[],
): StrengthChoices {
  const solved = curve.filter(({ chiSquare }) => !Number.isNaN(chiSquare));
  if (solved.length === 0) {
    const none = { strength: null, note: 'The problem has no single solution at any strength.' };
    return { discrepancy: none, gcv: none, corner: none };
  }
  return {
    discrepancy: byDiscrepancy(problem, work, solved),
    gcv: byCrossValidation(problem, work, solved),
    corner: byCorner(solved),
  };
}

/**
 * Discrepancy principle (Morozov, Soviet Math. Doklady 7, 414 (1966)): the strength at which χ² equals the number of points. χ²
 * rises with µ, with the constraint as well as without, so the root in ln µ is found by regula falsi (Illinois) between two
 * points of the curve. Where χ² is smaller everywhere the strongest of the curve is chosen; where it is larger everywhere, none.
 */
function byDiscrepancy(
  problem: PenalisedProblem,
  work: PenalisedWork,
  curve: readonly CurvePoint[],
): StrengthChoice {
  const points = work.dataCount;
  const rising = [...curve].sort((a, b) => a.strength - b.strength);
  const above = rising.findIndex(({ chiSquare }) => chiSquare >= points);
  if (above < 0) {
    return {
      strength: rising[rising.length - 1]!.strength,
      note: 'No strength gives χ² equal to the number of points: even the smoothest profile lies closer to them, and is taken.',
    };
  }
  if (above === 0) {
    return {
      strength: null,
      note: 'No strength gives χ² equal to the number of points: even the roughest profile allowed lies further from them.',
    };
  }
  const excess = (logStrength: number): number => {
    solveAtStrength(problem, work, Math.exp(logStrength));
    return Math.log(work.point.chiSquare / points);
  };
  let [low, high] = [Math.log(rising[above - 1]!.strength), Math.log(rising[above]!.strength)];
  let atLow = Math.log(rising[above - 1]!.chiSquare / points);
  let atHigh = Math.log(rising[above]!.chiSquare / points);
  let at = high;
  for (let step = 0, kept = 0; step < 80 && atHigh !== 0 && high - low > 1e-12; step++) {
    // A χ² of zero has no logarithm: then the middle.
    at = Number.isFinite(atLow)
      ? high - (atHigh * (high - low)) / (atHigh - atLow)
      : (low + high) / 2;
    const value = excess(at);
    if (Math.abs(value) < 1e-13) break;
    if (value > 0) {
      [high, atHigh] = [at, value];
      if (kept === 1) atLow /= 2;
      kept = 1;
    } else {
      [low, atLow] = [at, value];
      if (kept === -1) atHigh /= 2;
      kept = -1;
    }
  }
  return { strength: Math.exp(at), note: null };
}

/**
 * Generalised cross-validation (Golub, Heath and Wahba 1979): the strength of the smallest n·χ²/(n − p)², p the effective
 * parameters. With the constraint p is the trace over the columns that are not at zero, so the score jumps where that set
 * changes and the minimum is the best of the curve polished between its neighbours by Brent's method.
 */
function byCrossValidation(
  problem: PenalisedProblem,
  work: PenalisedWork,
  curve: readonly CurvePoint[],
): StrengthChoice {
  let best = 0;
  for (let k = 1; k < curve.length; k++) if (curve[k]!.gcv < curve[best]!.gcv) best = k;
  const { strength, gcv } = curve[best]!;
  if (!Number.isFinite(gcv))
    return {
      strength: null,
      note: 'The score of cross-validation does not exist at any strength.',
    };
  if (best === 0 || best === curve.length - 1) {
    const strong = strength >= Math.max(curve[0]!.strength, curve[curve.length - 1]!.strength);
    return {
      strength,
      note: `The score of cross-validation still falls at the ${strong ? 'strong' : 'weak'} end of the range.`,
    };
  }
  const ends = [Math.log(curve[best - 1]!.strength), Math.log(curve[best + 1]!.strength)];
  const { x, value } = minimiseOnLine(
    (logStrength) => {
      solveAtStrength(problem, work, Math.exp(logStrength));
      return work.point.gcv;
    },
    Math.min(...ends),
    Math.log(strength),
    Math.max(...ends),
    1e-5,
  );
  return { strength: value <= gcv ? Math.exp(x) : strength, note: null };
}

/**
 * Corner of the L-curve (Hansen, SIAM Review 34, 561 (1992)): the point of the curve with the largest curvature of ln‖Lx − t‖
 * against ln‖Kx − y‖. The direction of the curve is known at each point, not differenced: dχ²/dµ = −µ·d‖Lx − t‖²/dµ (with the
 * constraint too, as neither x nor the multipliers enter to first order), so its slope is −χ²/(µ‖Lx − t‖²); curvature is the
 * change of that angle over the chords to both neighbours.
 */
function byCorner(curve: readonly CurvePoint[]): StrengthChoice {
  const points = [...curve]
    .filter(({ chiSquare, roughness }) => chiSquare > 0 && roughness > 0)
    .sort((a, b) => a.strength - b.strength);
  let best = -1;
  let largest = 0;
  for (let k = 1; k + 1 < points.length; k++) {
    const [before, here, after] = [points[k - 1]!, points[k]!, points[k + 1]!];
    const length = chord(before, here) + chord(here, after);
    const turn = angle(after) - angle(before);
    if (length > SHORTEST_CHORD && turn > largest * length) {
      best = k;
      largest = turn / length;
    }
  }
  if (best < 0) return { strength: null, note: 'The L-curve has no corner: it bends nowhere.' };
  return { strength: points[best]!.strength, note: null };
}

/** Three points closer together than this lie on top of each other: their angles differ by rounding. */
const SHORTEST_CHORD = 1e-9;

function angle({ strength, chiSquare, roughness }: CurvePoint): number {
  return -Math.atan(chiSquare / (strength * roughness * roughness));
}

function chord(a: CurvePoint, b: CurvePoint): number {
  return Math.hypot(Math.log(b.chiSquare / a.chiSquare) / 2, Math.log(b.roughness / a.roughness));
}
