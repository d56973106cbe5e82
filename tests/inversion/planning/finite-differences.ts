import {
  foldScan,
  valuesOf,
  type FitAnswer,
  type FitInput,
  type ParameterValues,
} from '@/lib/inversion/index';
import { compileInput } from '@/lib/inversion/fit/prepare-fit';
import type { PreparedFit } from '@/lib/inversion/index';

/** ∂ŷ/∂θ by central differences of the fold, row-major energies × prepared.parameterNames. */
export function finiteDifferences(
  { input, parameterNames }: PreparedFit,
  answer: Pick<FitAnswer, 'parameters'>,
  energiesKeV: readonly number[],
): Float64Array {
  const values = valuesOf(answer);
  const scale = input.parameters.depthScale;
  const template: FitInput = {
    ...input,
    points: energiesKeV.map((energyKeV) => ({ energyKeV, value: 0, sigma: 1, enabled: true })),
    parameters: scale ? { depthScale: scale } : {},
  };
  const prepared = compileInput(template);
  const slopes = new Float64Array(energiesKeV.length * parameterNames.length);
  parameterNames.forEach((name, k) => {
    const step = 1e-4 * Math.max(0.1, Math.abs(values[name]!));
    const at = (shift: number): Float64Array =>
      foldScan(prepared, { ...values, [name]: values[name]! + shift } as ParameterValues);
    const [up, down] = [at(step), at(-step)];
    energiesKeV.forEach((_, row) => {
      slopes[row * parameterNames.length + k] = (up[row]! - down[row]!) / (2 * step);
    });
  });
  return slopes;
}
