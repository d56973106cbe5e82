import { foldStart } from '../fold/fold-edge';
import { solveBounded } from './solve-bounded';
import type { Data, Model, Problem, Workspace } from './model';

/**
 * Normal equations of the levels for given shares: the columns of the top, bulk and cap level are 1 − q − S, S and q,
 * each divided by σ; priors add one row each.
 */
export function levelEquations(
  model: Model,
  data: Data,
  shares: Float64Array,
  sharesAt: number,
  capShares: Float64Array,
  gram: Float64Array,
  moment: Float64Array,
): void {
  const { rowCount, levelCount, shapeCount, priorInverseSigma } = model;
  const { y, inverseSigma, priorMean } = data;
  let g00 = 0;
  let g01 = 0;
  let g11 = 0;
  let g02 = 0;
  let g12 = 0;
  let g22 = 0;
  let h0 = 0;
  let h1 = 0;
  let h2 = 0;
  for (let i = 0; i < rowCount; i++) {
    const inverse = inverseSigma[i]!;
    const cap = levelCount > 2 ? capShares[i]! * inverse : 0;
    const bulk = shares[sharesAt + i]! * inverse;
    const top = inverse - cap - bulk;
    const value = y[i]! * inverse;
    g00 += top * top;
    g01 += top * bulk;
    g11 += bulk * bulk;
    h0 += top * value;
    h1 += bulk * value;
    if (levelCount > 2) {
      g02 += top * cap;
      g12 += bulk * cap;
      g22 += cap * cap;
      h2 += cap * value;
    }
  }
  const n = levelCount;
  gram[0] = g00;
  gram[1] = gram[n] = g01;
  gram[n + 1] = g11;
  moment[0] = h0;
  moment[1] = h1;
  if (n > 2) {
    gram[2] = gram[6] = g02;
    gram[5] = gram[7] = g12;
    gram[8] = g22;
    moment[2] = h2;
  }
  for (let k = 0; k < n; k++) {
    const weight = priorInverseSigma[shapeCount + k]! ** 2;
    gram[k * n + k] = gram[k * n + k]! + weight;
    moment[k] = moment[k]! + weight * priorMean[shapeCount + k]!;
  }
}

/** Weighted mean of the observations: the level that an undetermined level falls back to. */
export function meanLevel({ y, inverseSigma }: Data): number {
  let sum = 0;
  let weights = 0;
  for (let i = 0; i < y.length; i++) {
    const weight = inverseSigma[i]! ** 2;
    sum += weight * y[i]!;
    weights += weight;
  }
  return sum / weights;
}

/** Folds the trial profile and the cap at the nonlinear part of θ into the workspace. */
export function foldAt(model: Model, work: Workspace, theta: Float64Array): void {
  const { kernel, trial, capNm, scaleIndex } = model;
  const scale = theta[scaleIndex]!;
  trial.fold(kernel, theta, capNm, scale, work.fold);
  if (capNm > 0) foldStart(kernel, capNm / scale, work.capShare, work.capByStart);
}

/** ŷ at the levels of θ, after foldAt. */
export function predictFromFold(model: Model, work: Workspace, theta: Float64Array): void {
  const top = theta[model.shapeCount]!;
  const bulk = theta[model.shapeCount + 1]!;
  const cap = model.levelCount > 2 ? theta[model.shapeCount + 2]! : 0;
  const { fold, capShare, predicted } = work;
  for (let i = 0; i < model.rowCount; i++) {
    predicted[i] = top + (bulk - top) * fold.share[i]! + (cap - top) * capShare[i]!;
  }
}

/**
 * Φ at θ with the levels that are not held re-solved exactly within their bounds (separable least squares, Golub and
 * Pereyra 1973). Writes the levels into θ and fold, prediction and residual into the workspace.
 *
 * @param held 1 where a parameter keeps the value that θ carries.
 */
export function evaluate(
  { model, data, work, fallback }: Problem,
  theta: Float64Array,
  held: Uint8Array,
): number {
  foldAt(model, work, theta);
  const { levelCount, shapeCount } = model;
  levelEquations(model, data, work.fold.share, 0, work.capShare, work.gram, work.moment);
  for (let k = 0; k < levelCount; k++) {
    work.heldLevel[k] = held[shapeCount + k]!;
    work.levels[k] = theta[shapeCount + k]!;
  }
  solveBounded(
    levelCount,
    work.gram,
    work.moment,
    model.lower,
    model.upper,
    shapeCount,
    work.heldLevel,
    fallback,
    work.levels,
  );
  for (let k = 0; k < levelCount; k++) theta[shapeCount + k] = work.levels[k]!;
  predictFromFold(model, work, theta);
  return objectiveAt(model, data, work, theta);
}

/** Data term of Φ: Σ ((y − ŷ)/σ)², leaving the reduced residuals in the workspace. */
export function dataChiSquare(
  { rowCount }: Model,
  { y, inverseSigma }: Data,
  { predicted, residual }: Workspace,
): number {
  let sum = 0;
  for (let i = 0; i < rowCount; i++) {
    const r = (y[i]! - predicted[i]!) * inverseSigma[i]!;
    residual[i] = r;
    sum += r * r;
  }
  return sum;
}

export function objectiveAt(
  model: Model,
  data: Data,
  work: Workspace,
  theta: Float64Array,
): number {
  return dataChiSquare(model, data, work) + priorChiSquare(model, data, theta);
}

export function priorChiSquare(
  { size, priorInverseSigma }: Model,
  { priorMean }: Data,
  theta: Float64Array,
): number {
  let sum = 0;
  for (let k = 0; k < size; k++) sum += ((theta[k]! - priorMean[k]!) * priorInverseSigma[k]!) ** 2;
  return sum;
}

/** Whitened Jacobian ∂ŷ/∂θ_k/σ of all parameters at θ, after foldAt. */
export function fillJacobian({ model, data, work }: Problem, theta: Float64Array): void {
  const { rowCount, shapeCount, levelCount, scaleIndex, capNm } = model;
  const { inverseSigma } = data;
  const { fold, capShare, capByStart, jacobian } = work;
  const top = theta[shapeCount]!;
  const contrast = theta[shapeCount + 1]! - top;
  const capContrast = levelCount > 2 ? theta[shapeCount + 2]! - top : 0;
  const scale = theta[scaleIndex]!;
  for (let k = 0; k < shapeCount; k++) {
    const byShape = fold.byShape[k]!;
    for (let i = 0; i < rowCount; i++)
      jacobian[k * rowCount + i] = contrast * byShape[i]! * inverseSigma[i]!;
  }
  const topAt = shapeCount * rowCount;
  const bulkAt = topAt + rowCount;
  const capAt = bulkAt + rowCount;
  const scaleAt = scaleIndex * rowCount;
  const startByScale = -capNm / (scale * scale);
  for (let i = 0; i < rowCount; i++) {
    const inverse = inverseSigma[i]!;
    const cap = capNm > 0 ? capShare[i]! : 0;
    jacobian[topAt + i] = (1 - cap - fold.share[i]!) * inverse;
    jacobian[bulkAt + i] = fold.share[i]! * inverse;
    if (levelCount > 2) jacobian[capAt + i] = cap * inverse;
    const capPart = capNm > 0 ? capContrast * capByStart[i]! * startByScale : 0;
    jacobian[scaleAt + i] = (contrast * fold.byScale[i]! + capPart) * inverse;
  }
}
