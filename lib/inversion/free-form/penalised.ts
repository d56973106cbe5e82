import { forwardSubstitute } from './column-solver';
import {
  createNonNegativeState,
  solveNonNegative,
  solveUnconstrained,
  type LinearSystem,
  type NonNegativeState,
  type SolveStatus,
} from './non-negative';

/** A matrix by columns: values[j·rows + i]. */
export interface ColumnMatrix {
  rows: number;
  columns: number;
  values: Float64Array;
}

/**
 * min ‖K x − y‖² + µ·‖L x − t‖², with K and y whitened, and x ≥ 0 unless the problem is unconstrained. t = L u₀ draws the
 * solution towards a reference u₀; zero draws it towards smoothness alone.
 */
export interface PenalisedProblem {
  design: ColumnMatrix;
  data: Float64Array;
  penalty: ColumnMatrix;
  target: Float64Array;
  nonNegative: boolean;
}

/** One point of the curve over the strength µ of the penalty. */
export interface CurvePoint {
  strength: number;
  /** ‖K x − y‖² */
  chiSquare: number;
  /** ‖L x − t‖ */
  roughness: number;
  /** Trace of K (KᵀK + µLᵀL)⁻¹ Kᵀ over the columns that are not at zero: how many numbers the data decide. */
  effectiveParameters: number;
  /** n·χ²/(n − effective parameters)², Golub, Heath and Wahba, Technometrics 21, 215 (1979); Infinity where nothing is left. */
  gcv: number;
}

/** Scratch of one problem. The solution at the strength evaluated last stands in `state.x`. */
export interface PenalisedWork {
  system: LinearSystem;
  state: NonNegativeState;
  dataCount: number;
  column: Float64Array;
  point: CurvePoint;
  status: SolveStatus;
}

/** @param dataCount number of observations among the rows of K: rows of points switched off are zero and do not count. */
export function createPenalisedWork(problem: PenalisedProblem, dataCount: number): PenalisedWork {
  const { design, penalty, nonNegative } = problem;
  const rows = design.rows + penalty.rows;
  const { columns } = design;
  const state = createNonNegativeState(rows, columns);
  // Every column begins as passive: right wherever the constraint does not bind, as for large strengths.
  if (nonNegative) state.x.fill(1);
  return {
    system: {
      rows,
      columns,
      matrix: new Float64Array(rows * columns),
      extent: stackedExtent(problem),
      b: new Float64Array(rows),
    },
    state,
    dataCount,
    column: new Float64Array(columns),
    point: { strength: NaN, chiSquare: NaN, roughness: NaN, effectiveParameters: NaN, gcv: NaN },
    status: 'solved',
  };
}

/** Leading rows of each column of [K; √µ L] that hold anything. */
export function stackedExtent({
  design,
  penalty,
}: Pick<PenalisedProblem, 'design' | 'penalty'>): Int32Array {
  return Int32Array.from({ length: design.columns }, (_, j) => {
    let last = penalty.rows;
    while (last > 0 && penalty.values[j * penalty.rows + last - 1] === 0) last--;
    return design.rows + last;
  });
}

/**
 * Solves at one strength µ, from the passive set of the strength before, into work.state.x, work.point and work.status. Where the
 * positive columns are dependent the constrained problem is begun again from none; what stays dependent is NaN throughout.
 */
export function solveAtStrength(
  problem: PenalisedProblem,
  work: PenalisedWork,
  strength: number,
): void {
  const { system, state } = work;
  stack(problem, system, Math.sqrt(strength));
  const solve = problem.nonNegative ? solveNonNegative : solveUnconstrained;
  work.status = solve(system, state);
  if (work.status === 'dependent' && problem.nonNegative) {
    state.x.fill(0);
    work.status = solve(system, state);
  }
  if (work.status === 'dependent') {
    state.x.fill(NaN);
    state.count = 0;
  }
  measure(problem, work, strength);
}

/** [K; √µ L] by columns into `matrix`. */
export function stackMatrix(
  { design, penalty }: Pick<PenalisedProblem, 'design' | 'penalty'>,
  root: number,
  matrix: Float64Array,
): void {
  const rows = design.rows + penalty.rows;
  for (let j = 0; j < design.columns; j++) {
    const at = j * rows;
    for (let i = 0; i < design.rows; i++) matrix[at + i] = design.values[j * design.rows + i]!;
    for (let i = 0; i < penalty.rows; i++)
      matrix[at + design.rows + i] = root * penalty.values[j * penalty.rows + i]!;
  }
}

/** [K; √µ L] and [y; √µ t]. */
function stack(problem: PenalisedProblem, { matrix, b }: LinearSystem, root: number): void {
  const { design, data, penalty, target } = problem;
  stackMatrix(problem, root, matrix);
  for (let i = 0; i < design.rows; i++) b[i] = data[i]!;
  for (let i = 0; i < penalty.rows; i++) b[design.rows + i] = root * target[i]!;
}

function measure(problem: PenalisedProblem, work: PenalisedWork, strength: number): void {
  const { point, dataCount, state } = work;
  point.strength = strength;
  point.chiSquare = squaredDistance(problem.design, problem.data, state.x);
  point.roughness = Math.sqrt(squaredDistance(problem.penalty, problem.target, state.x));
  point.effectiveParameters =
    work.status === 'dependent' ? NaN : traceOfInfluence(problem.design, work);
  const left = dataCount - point.effectiveParameters;
  point.gcv = left <= 0 ? Infinity : (dataCount * point.chiSquare) / (left * left);
}

function squaredDistance(
  { rows, columns, values }: ColumnMatrix,
  b: Float64Array,
  x: Float64Array,
): number {
  let square = 0;
  for (let i = 0; i < rows; i++) {
    let residual = b[i]!;
    for (let j = 0; j < columns; j++) residual -= values[j * rows + i]! * x[j]!;
    square += residual * residual;
  }
  return square;
}

/** ‖K_P R⁻¹‖² with R of the augmented passive columns: Q₁ = K_P R⁻¹ is the upper block of Q and the influence is Q₁Q₁ᵀ. */
function traceOfInfluence(
  { rows, values }: ColumnMatrix,
  { state: { passive, count, solver }, column }: PenalisedWork,
): number {
  let trace = 0;
  for (let i = 0; i < rows; i++) {
    for (let k = 0; k < count; k++) column[k] = values[passive[k]! * rows + i]!;
    forwardSubstitute(solver, count, column);
    for (let k = 0; k < count; k++) trace += column[k]! * column[k]!;
  }
  return trace;
}
