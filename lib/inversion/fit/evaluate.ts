import { foldStart } from '../fold/fold-edge';
import { whiten } from '../linalg/whitener';
import { solveBounded } from './solve-bounded';
import type { Data, Model, Problem, Workspace } from './model';

/** Level that an undetermined level falls back to: the mean of the observations, weighted by V⁻¹. */
export function meanLevel({ unit }: Pick<Model, 'unit'>, { target }: Data): number {
  let sum = 0;
  let weights = 0;
  for (let i = 0; i < target.length; i++) {
    sum += unit[i]! * target[i]!;
    weights += unit[i]! * unit[i]!;
  }
  return sum / weights;
}

/** Folds the trial profile and the cap at the nonlinear part of θ into the workspace. */
export function foldAt(model: Model, work: Workspace, theta: Float64Array): void {
  const { kernel, trial, capNm, scaleIndex } = model;
  const scale = theta[scaleIndex]!;
  trial.fold(kernel, theta, capNm, scale, work.fold);
  if (capNm > 0) foldStart(kernel, capNm / scale, work.capShare, work.capByStart);
  whitenColumns(model, work);
}

function whitenColumns({ rowCount, levelCount, unit, whitener }: Model, work: Workspace): void {
  const { columns, fold, capShare } = work;
  const bulkAt = rowCount;
  for (let i = 0; i < rowCount; i++) columns[bulkAt + i] = fold.share[i]!;
  whiten(whitener, columns, bulkAt);
  const capAt = 2 * rowCount;
  if (levelCount > 2) {
    for (let i = 0; i < rowCount; i++) columns[capAt + i] = capShare[i]!;
    whiten(whitener, columns, capAt);
  }
  for (let i = 0; i < rowCount; i++) {
    const cap = levelCount > 2 ? columns[capAt + i]! : 0;
    columns[i] = unit[i]! - cap - columns[bulkAt + i]!;
  }
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

/** Normal equations of the levels after foldAt; a prior adds one row. */
function levelEquations(
  { rowCount, levelCount, shapeCount, priorInverseSigma }: Model,
  { target, priorMean }: Data,
  { columns, gram, moment }: Workspace,
): void {
  for (let k = 0; k < levelCount; k++) {
    const weight = priorInverseSigma[shapeCount + k]! ** 2;
    const kAt = k * rowCount;
    let right = weight * priorMean[shapeCount + k]!;
    for (let i = 0; i < rowCount; i++) right += columns[kAt + i]! * target[i]!;
    moment[k] = right;
    for (let l = 0; l <= k; l++) {
      const lAt = l * rowCount;
      let sum = k === l ? weight : 0;
      for (let i = 0; i < rowCount; i++) sum += columns[kAt + i]! * columns[lAt + i]!;
      gram[k * levelCount + l] = gram[l * levelCount + k] = sum;
    }
  }
}

/**
 * Φ at θ with the levels that are not held re-solved exactly within their bounds (separable least squares, Golub and
 * Pereyra 1973). Writes the levels into θ and fold and residual into the workspace.
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
  levelEquations(model, data, work);
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
  return dataChiSquare(model, data, work, theta) + priorChiSquare(model, data, theta);
}

/** (y − ŷ)ᵀV⁻¹(y − ŷ) at the levels of θ after foldAt, leaving W·(y − ŷ) in the workspace. */
export function dataChiSquare(
  { rowCount, shapeCount, levelCount }: Model,
  { target }: Data,
  { columns, residual }: Workspace,
  theta: Float64Array,
): number {
  const top = theta[shapeCount]!;
  const bulk = theta[shapeCount + 1]!;
  const cap = levelCount > 2 ? theta[shapeCount + 2]! : 0;
  let sum = 0;
  for (let i = 0; i < rowCount; i++) {
    let r = target[i]! - top * columns[i]! - bulk * columns[rowCount + i]!;
    if (levelCount > 2) r -= cap * columns[2 * rowCount + i]!;
    residual[i] = r;
    sum += r * r;
  }
  return sum;
}

function priorChiSquare(
  { size, priorInverseSigma }: Model,
  { priorMean }: Data,
  theta: Float64Array,
): number {
  let sum = 0;
  for (let k = 0; k < size; k++) sum += ((theta[k]! - priorMean[k]!) * priorInverseSigma[k]!) ** 2;
  return sum;
}

/** Whitened Jacobian W·∂ŷ/∂θ_k of all parameters at θ, after foldAt. */
export function fillJacobian(
  { model, work }: Pick<Problem, 'model' | 'work'>,
  theta: Float64Array,
): void {
  const { rowCount, shapeCount, levelCount, scaleIndex, capNm, whitener } = model;
  const { fold, capByStart, jacobian, columns } = work;
  const top = theta[shapeCount]!;
  const contrast = theta[shapeCount + 1]! - top;
  const capContrast = levelCount > 2 ? theta[shapeCount + 2]! - top : 0;
  const scale = theta[scaleIndex]!;
  for (let k = 0; k < shapeCount; k++) {
    const byShape = fold.byShape[k]!;
    const at = k * rowCount;
    for (let i = 0; i < rowCount; i++) jacobian[at + i] = contrast * byShape[i]!;
    whiten(whitener, jacobian, at);
  }
  jacobian.set(columns, shapeCount * rowCount);
  const scaleAt = scaleIndex * rowCount;
  const startByScale = -capNm / (scale * scale);
  for (let i = 0; i < rowCount; i++) {
    const capPart = capNm > 0 ? capContrast * capByStart[i]! * startByScale : 0;
    jacobian[scaleAt + i] = contrast * fold.byScale[i]! + capPart;
  }
  whiten(whitener, jacobian, scaleAt);
}
