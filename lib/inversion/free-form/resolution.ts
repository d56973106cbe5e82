import { createColumnSolver, factorColumns, solveFactored } from './column-solver';
import { stackedExtent, stackMatrix, type ColumnMatrix } from './penalised';

export interface Resolution {
  /**
   * Averaging kernels (Backus and Gilbert, Geophys. J. R. astr. Soc. 16, 169 (1968)): row j says how the value found at knot j
   * answers to the true values at all knots. A row with its weight far from its knot, or spread wide, is a value that the scan
   * does not resolve. To draw it over depth, divide entry k by the area of hat k.
   */
  kernels: readonly (readonly number[])[];
  /** Trace of the matrix: how many numbers the data decide. */
  effectiveParameters: number;
}

/**
 * R = (KᵀK + µLᵀL)⁻¹KᵀK of the problem without constraint, K whitened; by QR of [K; √µ L], column by column as the
 * least-squares answer to [K e_k; 0]. Null where the columns are dependent to rounding.
 */
export function resolutionMatrix(
  design: ColumnMatrix,
  penalty: ColumnMatrix,
  strength: number,
): Resolution | null {
  const every = Int32Array.from({ length: design.columns }, (_, j) => j);
  return resolutionOn({ design, penalty, answers: design, chosen: every, strength }, (x) => x);
}

/**
 * The same with only the chosen columns free and the others at zero: how the constrained solution answers as long as the set of
 * zeros stays. `answers` holds what the true values do to the data (K by the knots), `toKnots` takes a solution to values at
 * the knots.
 */
export function resolutionOn(
  problem: {
    design: ColumnMatrix;
    penalty: ColumnMatrix;
    answers: ColumnMatrix;
    chosen: Int32Array;
    strength: number;
  },
  toKnots: (x: Float64Array) => Float64Array,
): Resolution | null {
  const { design, penalty, answers, chosen, strength } = problem;
  const rows = design.rows + penalty.rows;
  const columns = design.columns;
  const matrix = new Float64Array(rows * columns);
  stackMatrix(problem, Math.sqrt(strength), matrix);
  const solver = createColumnSolver(rows, columns);
  const extent = stackedExtent(problem);
  if (!factorColumns(solver, matrix, extent, chosen, chosen.length)) return null;
  const b = new Float64Array(rows);
  const x = new Float64Array(columns);
  const kernels = Array.from({ length: columns }, () => new Array<number>(columns).fill(0));
  let effectiveParameters = 0;
  for (let k = 0; k < columns; k++) {
    b.set(answers.values.subarray(k * answers.rows, (k + 1) * answers.rows));
    solveFactored(solver, b, chosen.length);
    x.fill(0);
    chosen.forEach((column, at) => {
      x[column] = solver.solution[at]!;
    });
    const answer = toKnots(x);
    for (let j = 0; j < columns; j++) kernels[j]![k] = answer[j]!;
    effectiveParameters += answer[k]!;
  }
  return { kernels, effectiveParameters };
}
