import type { Whitener } from '../linalg/whitener';
import { differenceOperator } from './differences';
import type { FreeFormInput } from './free-form-input';
import {
  observeAt,
  priorRows,
  toSteps,
  whitenData,
  whitenDesign,
  type Observation,
} from './observation';
import type { ColumnMatrix, PenalisedProblem } from './penalised';

export interface CompiledProblem {
  /** W·∂ŷ/∂u and L by the unknowns u. */
  design: ColumnMatrix;
  penalty: ColumnMatrix;
  /** The same by the steps of u where it is monotonic: what is solved. */
  problem: PenalisedProblem;
}

/** Whitened design, data and penalty at one depth scale. */
export function compileProblem(
  { points, difference, monotonic, reference }: FreeFormInput,
  observation: Observation,
  whitener: Whitener,
  scale: number,
  pointOfRow: Int32Array,
): CompiledProblem {
  const { knotsNm, plain, cap } = observation;
  const knots = knotsNm.length;
  const design = emptyMatrix(plain.rows + priorRows(cap), plain.columns);
  observeAt(observation, scale);
  whitenDesign(observation, whitener, design);
  const y = Float64Array.from(pointOfRow, (point) => points[point]!.value);
  const data = new Float64Array(design.rows);
  whitenData(observation, whitener, y, data);
  // A free cap level is a column more, which the penalty does not see.
  const penalty = emptyMatrix(knots - difference, plain.columns);
  penalty.values.set(differenceOperator(knotsNm, difference).values);
  const target = new Float64Array(penalty.rows);
  if (reference) {
    for (let j = 0; j < knots; j++)
      for (let i = 0; i < penalty.rows; i++)
        target[i] = target[i]! + penalty.values[j * penalty.rows + i]! * reference[j]!;
  }
  const problem: PenalisedProblem = {
    design: copyOf(design),
    data,
    penalty: copyOf(penalty),
    target,
    nonNegative: true,
  };
  toSteps(problem.design, knots, monotonic);
  toSteps(problem.penalty, knots, monotonic);
  clearRounding(problem.penalty);
  return { design, penalty, problem };
}

function emptyMatrix(rows: number, columns: number): ColumnMatrix {
  return { rows, columns, values: new Float64Array(rows * columns) };
}

function copyOf(matrix: ColumnMatrix): ColumnMatrix {
  return { ...matrix, values: Float64Array.from(matrix.values) };
}

/** Differences of a constant are zero; sums of the coefficients leave their rounding there, which would fill a banded matrix. */
function clearRounding({ rows, columns, values }: ColumnMatrix): void {
  for (let i = 0; i < rows; i++) {
    let largest = 0;
    for (let j = 0; j < columns; j++) largest = Math.max(largest, Math.abs(values[j * rows + i]!));
    for (let j = 0; j < columns; j++)
      if (Math.abs(values[j * rows + i]!) < 1e-13 * largest) values[j * rows + i] = 0;
  }
}
