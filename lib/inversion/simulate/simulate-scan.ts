import { InversionError } from '../errors';
import { compileInput } from '../fit/prepare-fit';
import type { PreparedFit } from '../fit/prepared-fit';
import { foldScan } from '../fold/fold-scan';
import { unwhiten } from '../linalg/whitener';
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
 * The scan that a trial profile would give, with seeded Gaussian noise of the stated σ, or of the covariance of the template
 * where it has one and no σ are stated.
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
  const covariance = sigmas === undefined ? (input.covariance ?? null) : null;
  const prepared = compileInput({ ...input, points: template, covariance });
  const expected = foldScan(prepared, values);
  const noise = Float64Array.from(points, (_, index) => normalStream(seed, index)());
  if (covariance) correlate(prepared, noise);
  else template.forEach(({ sigma }, index) => (noise[index] = noise[index]! * sigma));
  // A point out of use beyond the stopping set has no expectation and keeps its value.
  return points.map(({ value }, index) => ({
    ...template[index]!,
    value: Number.isNaN(expected[index]!) ? value : expected[index]! + noise[index]!,
  }));
}

/** Unit noise of the points as noise of covariance V; a point out of use keeps its own σ. */
function correlate({ problem, input }: PreparedFit, noise: Float64Array): void {
  const { pointOfRow, whitener } = problem.model;
  const rows = Float64Array.from(pointOfRow, (index) => noise[index]!);
  unwhiten(whitener, rows);
  input.points.forEach(({ sigma }, index) => (noise[index] = noise[index]! * sigma));
  pointOfRow.forEach((index, row) => {
    if (whitener.inverseSigma[row]! > 0) noise[index] = rows[row]!;
  });
}
