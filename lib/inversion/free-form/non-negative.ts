import {
  createColumnSolver,
  factorColumns,
  solveFactored,
  type ColumnSolver,
} from './column-solver';

/** min ‖A x − b‖; A column-major, extent[j] the number of leading rows of column j that hold anything. */
export interface LinearSystem {
  rows: number;
  columns: number;
  matrix: Float64Array;
  extent: Int32Array;
  b: Float64Array;
}

/** Solution and scratch of one shape of system, allocated once. */
export interface NonNegativeState {
  /** Where the solver starts (its positive entries are the first passive set) and where it ends. */
  x: Float64Array;
  /** Columns of the passive (positive) entries, ascending: the first `count`. The factor in `solver` is theirs. */
  passive: Int32Array;
  count: number;
  isPassive: Uint8Array;
  refused: Uint8Array;
  norms: Float64Array;
  residual: Float64Array;
  /** Aᵀ(b − A x): minus half the gradient of ‖A x − b‖². */
  gradient: Float64Array;
  solver: ColumnSolver;
}

export function createNonNegativeState(rows: number, columns: number): NonNegativeState {
  return {
    x: new Float64Array(columns),
    passive: new Int32Array(columns),
    count: 0,
    isPassive: new Uint8Array(columns),
    refused: new Uint8Array(columns),
    norms: new Float64Array(columns),
    residual: new Float64Array(rows),
    gradient: new Float64Array(columns),
    solver: createColumnSolver(rows, columns),
  };
}

/** A gradient entry counts as positive above this share of the terms that it is the difference of: a few roundings. */
const ROUNDING = 4e-15;

export type SolveStatus = 'solved' | 'dependent' | 'iteration-limit';

/**
 * Non-negative least squares by the active-set method of C. L. Lawson and R. J. Hanson, Solving Least Squares Problems (1974),
 * chapter 23, started from the passive set of `state.x` instead of the empty one, which saves most steps where a neighbouring
 * problem has just been solved. At the end x ≥ 0 and Aᵀ(b − A x) is 0 on the passive set and ≤ 0 off it (Kuhn and Tucker).
 *
 * @returns 'dependent' where the passive columns are dependent to rounding, 'iteration-limit' after 10·columns + 30 steps.
 */
export function solveNonNegative(system: LinearSystem, state: NonNegativeState): SolveStatus {
  const { isPassive, refused, x } = state;
  for (let j = 0; j < system.columns; j++) {
    if (!(x[j]! > 0)) x[j] = 0;
    isPassive[j] = x[j]! > 0 ? 1 : 0;
    state.norms[j] = normOf(system, j);
  }
  refused.fill(0);
  let entering = -1;
  for (let step = 0; step < 10 * system.columns + 30; step++) {
    const move = moveToPassiveMinimum(system, state, entering);
    if (move === 'dependent') return move;
    if (move === 'refused') refused[entering] = 1;
    else refused.fill(0);
    fillGradient(system, state);
    entering = steepest(system, state);
    if (entering >= 0) isPassive[entering] = 1;
    else if (move === 'moved' || solvePassive(system, state)) return 'solved';
    else return 'dependent';
  }
  return 'iteration-limit';
}

/** Least squares on all columns, whatever their sign. */
export function solveUnconstrained(system: LinearSystem, state: NonNegativeState): SolveStatus {
  state.isPassive.fill(1);
  if (!solvePassive(system, state)) return 'dependent';
  for (let j = 0; j < system.columns; j++) state.x[j] = state.solver.solution[j]!;
  fillGradient(system, state);
  return 'solved';
}

function solvePassive(
  { columns, matrix, extent, b }: LinearSystem,
  state: NonNegativeState,
): boolean {
  const { passive, isPassive, solver } = state;
  let count = 0;
  for (let j = 0; j < columns; j++) if (isPassive[j]) passive[count++] = j;
  state.count = count;
  if (!factorColumns(solver, matrix, extent, passive, count)) return false;
  solveFactored(solver, b, count);
  return true;
}

/** Solves on the passive set; where that leaves x ≥ 0, walks to the border, drops what meets it, and solves again. */
function moveToPassiveMinimum(
  system: LinearSystem,
  state: NonNegativeState,
  entering: number,
): 'moved' | 'refused' | 'dependent' {
  const { x, passive, isPassive, solver } = state;
  for (let first = true; ; first = false) {
    const solved = solvePassive(system, state);
    if (first && entering >= 0 && !(solved && enters(state, entering))) {
      // Its gradient was rounding: the set before it stays (Lawson and Hanson, chapter 23, remark on step 6).
      isPassive[entering] = 0;
      return 'refused';
    }
    if (!solved) return 'dependent';
    let share = 1;
    for (let k = 0; k < state.count; k++) share = Math.min(share, borderShare(state, k));
    if (share === 1) {
      for (let k = 0; k < state.count; k++) x[passive[k]!] = solver.solution[k]!;
      return 'moved';
    }
    for (let k = 0; k < state.count; k++) {
      const j = passive[k]!;
      const meets = borderShare(state, k) <= share;
      x[j] = meets ? 0 : x[j]! + share * (solver.solution[k]! - x[j]!);
      if (meets) isPassive[j] = 0;
    }
  }
}

/** Share of the way to the solution at which entry k meets zero; 1 where it does not. */
function borderShare({ x, passive, solver }: NonNegativeState, k: number): number {
  const now = x[passive[k]!]!;
  const next = solver.solution[k]!;
  return next > 0 ? 1 : now / (now - next);
}

function enters({ passive, count, solver }: NonNegativeState, column: number): boolean {
  for (let k = 0; k < count; k++) if (passive[k] === column) return solver.solution[k]! > 0;
  return false;
}

function fillGradient(
  { rows, columns, matrix, extent, b }: LinearSystem,
  { x, residual, gradient }: NonNegativeState,
): void {
  for (let i = 0; i < rows; i++) residual[i] = b[i]!;
  for (let j = 0; j < columns; j++) {
    const value = x[j]!;
    if (value === 0) continue;
    for (let i = 0, at = j * rows; i < extent[j]!; i++)
      residual[i] = residual[i]! - matrix[at + i]! * value;
  }
  for (let j = 0; j < columns; j++) {
    let sum = 0;
    for (let i = 0, at = j * rows; i < extent[j]!; i++) sum += matrix[at + i]! * residual[i]!;
    gradient[j] = sum;
  }
}

/** The entry at zero whose growth lowers ‖A x − b‖ most, each column measured by its own norm; −1 where none does. */
function steepest(
  { rows, columns, b }: LinearSystem,
  { x, isPassive, refused, gradient, norms }: NonNegativeState,
): number {
  let scale = 0;
  for (let i = 0; i < rows; i++) scale += b[i]! * b[i]!;
  scale = Math.sqrt(scale);
  for (let j = 0; j < columns; j++) scale += norms[j]! * x[j]!;
  let best = -1;
  let highest = ROUNDING * scale;
  for (let j = 0; j < columns; j++) {
    if (isPassive[j] || refused[j] || !(gradient[j]! > 0)) continue;
    const value = gradient[j]! / norms[j]!;
    if (value > highest) {
      best = j;
      highest = value;
    }
  }
  return best;
}

function normOf({ rows, matrix, extent }: LinearSystem, j: number): number {
  let square = 0;
  for (let i = 0, at = j * rows; i < extent[j]!; i++) square += matrix[at + i]! * matrix[at + i]!;
  return Math.sqrt(square);
}
