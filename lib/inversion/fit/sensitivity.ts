import { compileKernel, type Kernel } from '../fold/kernel';
import { stoppingProfileAt } from '../stopping/stopping-profile-at';
import type { FitAnswer } from '../types';
import { fillJacobian, foldAt } from './evaluate';
import type { Model } from './model';
import type { PreparedFit } from './prepared-fit';
import { thetaOf, valuesOf } from './theta-of';
import { createWorkspace } from './workspace';

/** A model whose rows are the profiles of a kernel, each with weight one. */
export function unweighted(
  kernel: Kernel,
): Pick<Model, 'kernel' | 'rowCount' | 'whitener' | 'unit'> {
  const unit = new Float64Array(kernel.rowCount).fill(1);
  return {
    kernel,
    rowCount: kernel.rowCount,
    whitener: { inverseSigma: unit, inverseFactor: null },
    unit,
  };
}

/**
 * ∂ŷ/∂θ_k of all parameters at the values of a fit and at any energies inside the stopping set, in the unit of the observable per
 * unit of the parameter.
 *
 * @returns row-major, energies × prepared.parameterNames.
 * @throws InversionError 'energy-outside-stopping-set'.
 */
export function sensitivityAt(
  prepared: PreparedFit,
  answer: FitAnswer,
  energiesKeV: readonly number[],
): Float64Array {
  const { input, problem } = prepared;
  const profiles = energiesKeV.map((energy) => stoppingProfileAt(input.stopping, energy));
  const model: Model = { ...problem.model, ...unweighted(compileKernel(profiles)) };
  const work = createWorkspace(model);
  const theta = thetaOf(prepared, valuesOf(answer));
  foldAt(model, work, theta);
  fillJacobian({ model, work }, theta);
  const { size, rowCount } = model;
  return Float64Array.from(
    { length: rowCount * size },
    (_, at) => work.jacobian[(at % size) * rowCount + Math.floor(at / size)]!,
  );
}
