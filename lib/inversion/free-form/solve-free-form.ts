import { InversionError } from '../errors';
import type { ProfileUnit, Residual } from '../types';
import { chooseStrength, type StrengthChoices } from './choose-strength';
import type { SolveStatus } from './non-negative';
import { fromSteps, predictRows } from './observation';
import { solveAtStrength, type CurvePoint } from './penalised';
import type { PreparedFreeForm } from './prepare-free-form';
import { resolutionMatrix, resolutionOn, type Resolution } from './resolution';
import { strengthCurve, strengthGrid } from './strength-curve';

export type StrengthRule = keyof StrengthChoices;

/** The free-form profile at one strength µ of the penalty. */
export interface FreeFormSolution extends CurvePoint {
  status: SolveStatus;
  knotsNm: readonly number[];
  /** u per knot, in the unit of the unknown (observedLine). */
  unknowns: readonly number[];
  /**
   * Level of the cap where it is an unknown; null elsewhere. It is kept at or above 0 only: a fraction above 1 says that cap, levels and
   * stopping profiles contradict each other, and holding the level is then meant.
   */
  levelCap: number | null;
  unit: ProfileUnit;
  /** Profile value per knot: cm⁻³ or share; null above the ceiling of a saturating fraction. */
  values: readonly (number | null)[];
  residuals: readonly Residual[];
  /** What the scan resolves at this strength, were the values free; null where the system is singular to rounding. */
  resolution: Resolution | null;
  /** The same with the values at zero (or the steps of a monotonic profile that are zero) kept there. */
  constrainedResolution: Resolution | null;
}

export interface FreeFormAnswer extends FreeFormSolution {
  /** Which rule chose the strength. */
  chosenBy: StrengthRule | 'caller';
  choices: StrengthChoices;
  /** In descending strength. */
  curve: readonly CurvePoint[];
}

export interface FreeFormOptions {
  /** A strength, or the rule that chooses it: 'discrepancy' when left out. */
  strength?: number | StrengthRule;
  /** Strengths of the curve; 40 by strengthGrid when left out. */
  strengths?: readonly number[];
}

/**
 * Free-form profile: min (y − Ku)ᵀV⁻¹(y − Ku) + µ‖L(u − u₀)‖² with u ≥ 0, or u monotonic and ≥ 0, over a curve of strengths µ,
 * with the three rules that choose one. Where the rule wanted chooses none, the corner does, else cross-validation.
 *
 * Why discrepancy is the default: on 60 simulated scans of 13 points (edge at 70 nm, width 12 nm, σ 0.005 of a contrast of
 * 0.42, first differences) the rms error of the share within reach had a median of 0.054 by discrepancy, 0.062 by
 * cross-validation and 0.047 by the corner, and a 90 % quantile of 0.08, 1.2 and 0.10: with so few points cross-validation is
 * sometimes far too weak. Monotonic: 0.047, 0.039 and 0.031, and 0.073, 0.075 and 0.063. The best strength of each curve would
 * have given 0.039, monotonic 0.025.
 *
 * @throws InversionError 'bad-strength' for a strength that is not positive and finite, 'too-few-strengths' for a curve of fewer than three.
 */
export function solveFreeForm(
  prepared: PreparedFreeForm,
  options: FreeFormOptions = {},
): FreeFormAnswer {
  const { problem, work, dataCount } = prepared;
  const strengths = options.strengths ?? strengthGrid(problem, dataCount);
  if (strengths.length < 3) {
    throw new InversionError(
      'too-few-strengths',
      `A curve over the strength of the penalty needs at least three points, not ${strengths.length}.`,
    );
  }
  Array.from(strengths).forEach(checkStrength);
  if (typeof options.strength === 'number') checkStrength(options.strength);
  const curve = strengthCurve(problem, work, Float64Array.from(strengths).sort().reverse());
  const choices = chooseStrength(problem, work, curve);
  const { strength, chosenBy } = chosen(options.strength ?? 'discrepancy', choices);
  const at = strength ?? curve[0]!.strength;
  return { ...freeFormAt(prepared, at), chosenBy, choices, curve };
}

/** The rules in the order in which they step in for one that chooses nothing. */
const STEP_IN: readonly StrengthRule[] = ['corner', 'gcv'];

function chosen(
  wanted: number | StrengthRule,
  choices: StrengthChoices,
): { strength: number | null; chosenBy: StrengthRule | 'caller' } {
  if (typeof wanted === 'number') return { strength: wanted, chosenBy: 'caller' };
  const chosenBy = [wanted, ...STEP_IN].find((rule) => choices[rule].strength !== null) ?? wanted;
  return { strength: choices[chosenBy].strength, chosenBy };
}

function checkStrength(strength: number): void {
  if (strength > 0 && Number.isFinite(strength)) return;
  throw new InversionError(
    'bad-strength',
    `The strength of the penalty must be a positive number, not ${strength}.`,
  );
}

/**
 * The profile at one strength, without the curve: what follows a strength under the pointer.
 *
 * @throws InversionError 'bad-strength'.
 */
export function freeFormAt(prepared: PreparedFreeForm, strength: number): FreeFormSolution {
  checkStrength(strength);
  const { input, knotsNm, observation, problem, work, design, penalty } = prepared;
  const knots = knotsNm.length;
  solveAtStrength(problem, work, strength);
  const u = new Float64Array(design.columns);
  fromSteps(work.state.x, knots, input.monotonic, u);
  const point = { ...work.point };
  const passive = work.state.passive.slice(0, work.state.count);
  const values = new Float64Array(design.columns);
  return {
    ...point,
    status: work.status,
    knotsNm: Array.from(knotsNm),
    unknowns: Array.from(u.subarray(0, knots)),
    levelCap: observation.cap.kind === 'free' ? u[knots]! : null,
    unit: observation.line.unit,
    values: Array.from(u.subarray(0, knots), (value) => observation.line.valueOf(value)),
    residuals: residualsAt(prepared, u),
    resolution: resolutionMatrix(design, penalty, strength),
    constrainedResolution: resolutionOn(
      {
        design: problem.design,
        penalty: problem.penalty,
        answers: design,
        chosen: passive,
        strength,
      },
      (x) => {
        fromSteps(x, knots, input.monotonic, values);
        return values;
      },
    ),
  };
}

/** Residuals in the order of the scan; a point without a stopping profile has none. */
function residualsAt(
  { input, profiles, pointOfRow, observation }: PreparedFreeForm,
  u: Float64Array,
): Residual[] {
  const predicted = new Float64Array(pointOfRow.length);
  predictRows(observation, u, predicted);
  const rowOfPoint = new Map(Array.from(pointOfRow, (point, row) => [point, row]));
  return input.points.flatMap(({ energyKeV, value, sigma, enabled }, index) => {
    const row = rowOfPoint.get(index);
    if (row === undefined) return [];
    return {
      energyKeV,
      observed: value,
      sigma,
      predicted: predicted[row]!,
      reduced: (value - predicted[row]!) / sigma,
      enabled,
      interpolated: profiles[index]!.interpolatedBetween !== null,
    };
  });
}
