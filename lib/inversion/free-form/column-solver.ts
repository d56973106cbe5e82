/** Scratch of a least-squares solve on chosen columns of one matrix; allocated once, written by every solve. */
export interface ColumnSolver {
  rows: number;
  /** Factor of the chosen columns, column-major: R above the diagonal, Householder vectors from it downwards. */
  factor: Float64Array;
  diagonal: Float64Array;
  /** 2/vᵀv of each reflection, and the row after its last. */
  twoOverSquare: Float64Array;
  end: Int32Array;
  rhs: Float64Array;
  /** Value of each chosen column, in the order they were given. */
  solution: Float64Array;
}

export function createColumnSolver(rows: number, columns: number): ColumnSolver {
  return {
    rows,
    factor: new Float64Array(rows * columns),
    diagonal: new Float64Array(columns),
    twoOverSquare: new Float64Array(columns),
    end: new Int32Array(columns),
    rhs: new Float64Array(rows),
    solution: new Float64Array(columns),
  };
}

/** A column whose part below R is this small, relative to the whole, is made of those before it and rounding. */
const DEPENDENT = 1e-14;

/**
 * QR of the columns chosen[0 … count) of A by Householder reflections (Golub and Van Loan, Matrix Computations, section 5.2);
 * normal equations are never formed, so no digits are lost to the square of A. extent[j] is the number of leading rows of
 * column j that hold anything: below the largest extent so far there is nothing to eliminate, which keeps the banded rows of a
 * difference operator cheap.
 *
 * @returns false where the columns are dependent to rounding, or more than the rows.
 */
export function factorColumns(
  solver: ColumnSolver,
  matrix: Float64Array,
  extent: Int32Array,
  chosen: Int32Array,
  count: number,
): boolean {
  const { rows, factor } = solver;
  if (count > rows) return false;
  for (let k = 0; k < count; k++) {
    const from = chosen[k]! * rows;
    for (let i = 0, to = k * rows; i < rows; i++) factor[to + i] = matrix[from + i]!;
  }
  let end = 0;
  for (let k = 0; k < count; k++) {
    end = Math.min(rows, Math.max(end, extent[chosen[k]!]!, k + 1));
    if (!reflect(solver, k, count, end)) return false;
  }
  return true;
}

/** Zeroes column k below its diagonal, in rows k … end − 1, and carries the reflection to the columns after it. */
function reflect(solver: ColumnSolver, k: number, count: number, end: number): boolean {
  const { rows, factor, diagonal } = solver;
  const at = k * rows;
  let above = 0;
  for (let i = 0; i < k; i++) above += factor[at + i]! * factor[at + i]!;
  let square = 0;
  for (let i = k; i < end; i++) square += factor[at + i]! * factor[at + i]!;
  if (!(square > DEPENDENT * DEPENDENT * (above + square))) return false;
  const norm = factor[at + k]! > 0 ? -Math.sqrt(square) : Math.sqrt(square);
  const head = factor[at + k]! - norm;
  diagonal[k] = norm;
  factor[at + k] = head;
  // v = x − norm·e₁ has vᵀv = −2·norm·head.
  const twoOver = -1 / (norm * head);
  solver.twoOverSquare[k] = twoOver;
  solver.end[k] = end;
  for (let j = k + 1; j < count; j++) {
    const to = j * rows;
    let dot = 0;
    for (let i = k; i < end; i++) dot += factor[at + i]! * factor[to + i]!;
    dot *= twoOver;
    for (let i = k; i < end; i++) factor[to + i] = factor[to + i]! - dot * factor[at + i]!;
  }
  return true;
}

/** Least squares min ‖A_P x − b‖ into solver.solution, with the factor made last. */
export function solveFactored(solver: ColumnSolver, b: Float64Array, count: number): void {
  const { rows, factor, twoOverSquare, end, rhs, solution } = solver;
  for (let i = 0; i < rows; i++) rhs[i] = b[i]!;
  for (let k = 0; k < count; k++) {
    const at = k * rows;
    let dot = 0;
    for (let i = k; i < end[k]!; i++) dot += factor[at + i]! * rhs[i]!;
    dot *= twoOverSquare[k]!;
    for (let i = k; i < end[k]!; i++) rhs[i] = rhs[i]! - dot * factor[at + i]!;
  }
  for (let k = 0; k < count; k++) solution[k] = rhs[k]!;
  for (let k = count - 1; k >= 0; k--) {
    const value = solution[k]! / solver.diagonal[k]!;
    solution[k] = value;
    for (let i = 0, at = k * rows; i < k; i++) solution[i] = solution[i]! - factor[at + i]! * value;
  }
}

/** z ← R⁻ᵀ z in place for the factor made last. */
export function forwardSubstitute(
  { rows, factor, diagonal }: ColumnSolver,
  count: number,
  z: Float64Array,
): void {
  for (let k = 0; k < count; k++) {
    let sum = z[k]!;
    for (let i = 0, at = k * rows; i < k; i++) sum -= factor[at + i]! * z[i]!;
    z[k] = sum / diagonal[k]!;
  }
}
