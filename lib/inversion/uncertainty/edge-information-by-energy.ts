import { Matrix, solve } from 'ml-matrix';
import { fillJacobian, foldAt } from '../fit/evaluate';
import type { PreparedFit } from '../fit/prepared-fit';
import { thetaOf, valuesOf } from '../fit/theta-of';
import type { FitAnswer } from '../types';

/**
 * Share of each point in what the scan says of the edge depth (or the band bending): the whitened derivative ∂ŷ/∂W/σ with the part that the other
 * free parameters could explain projected out, squared, over its sum. Correlated points are whitened in ascending energy, so each
 * counts with what those below it do not say already. In the order of the scan; 0 where switched off. All 0
 * when the edge cannot be told from the other parameters.
 */
export function edgeInformationByEnergy(prepared: PreparedFit, answer: FitAnswer): number[] {
  const { model, work } = prepared.problem;
  const theta = thetaOf(prepared, valuesOf(answer));
  foldAt(model, work, theta);
  fillJacobian(prepared.problem, theta);
  const { rowCount, size } = model;
  const others = Array.from({ length: size - 1 }, (_, k) => k + 1).filter(
    (k) => !model.held[k] && theta[k]! > model.lower[k]! && theta[k]! < model.upper[k]!,
  );
  // Priors are rows of their own: what they fix, the points need not.
  const column = (k: number): number[] => [
    ...work.jacobian.subarray(k * rowCount, (k + 1) * rowCount),
    ...others.map((l) => (l === k ? model.priorInverseSigma[l]! : 0)),
  ];
  const edge = column(0);
  const nuisance = others.map(column);
  const remainder = nuisance.length === 0 ? edge : projectOut(edge, nuisance);
  const squares = remainder.slice(0, rowCount).map((value) => value * value);
  const total = squares.reduce((a, b) => a + b, 0);
  const shares = new Array<number>(prepared.input.points.length).fill(0);
  squares.forEach((value, row) => {
    shares[model.pointOfRow[row]!] = total > 0 ? value / total : 0;
  });
  return shares;
}

function projectOut(vector: number[], columns: number[][]): number[] {
  const used = columns
    .map((column) => ({ column, norm: Math.hypot(...column) }))
    .filter(({ norm }) => norm > 0);
  if (used.length === 0) return vector;
  const design = new Matrix(
    used.map(({ column, norm }) => column.map((value) => value / norm)),
  ).transpose();
  const right = Matrix.columnVector(vector);
  const fitted = design.mmul(solve(design, right, true));
  return Matrix.sub(right, fitted).to1DArray();
}
