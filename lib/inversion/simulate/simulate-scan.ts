import { InversionError } from '../errors';
import { compileInput } from '../fit/prepare-fit';
import { foldScan } from '../fold/fold-scan';
import { normalStream } from '../statistics/random';
import type { FitInput, ParameterValues, ScanPoint } from '../types';

export interface Simulation {
  /** Energies, σ and everything else that a scan depends on; the values of its points are not read. */
  input: FitInput;
  values: ParameterValues;
  /** One σ for all points or one for each; those of the template when left out. */
  sigmas?: number | readonly number[];
  seed: number;
}

/**
 * The scan that a trial profile would give, with seeded Gaussian noise of the stated σ.
 *
 * @throws InversionError for a template that cannot be folded, or σ that are not positive or not one per point.
 */
export function simulateScan({ input, values, sigmas, seed }: Simulation): ScanPoint[] {
  const { points } = input;
  if (Array.isArray(sigmas) && sigmas.length !== points.length) {
    throw new InversionError(
      'bad-sigma',
      `${points.length} points need as many uncertainties, not ${sigmas.length}.`,
    );
  }
  const sigmaOf = (index: number): number =>
    sigmas === undefined
      ? points[index]!.sigma
      : typeof sigmas === 'number'
        ? sigmas
        : sigmas[index]!;
  const template = points.map((point, index) => ({ ...point, value: 0, sigma: sigmaOf(index) }));
  const expected = foldScan(compileInput({ ...input, points: template }), values);
  return template.map((point, index) => ({
    ...point,
    value: expected[index]! + point.sigma * normalStream(seed, index)(),
  }));
}
