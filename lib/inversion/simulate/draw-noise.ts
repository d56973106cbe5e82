import type { PreparedFit } from '../fit/prepared-fit';

/**
 * Noise of the rows of a fit (points in ascending energy) as the scan states it. The rows are whitened, so that it is N(0, 1)
 * whatever their covariance. Rows out of use get none.
 *
 * @returns a function that writes one draw, taking its deviates from `normal` in the order of the rows in use.
 */
export function noiseOf({
  problem,
}: PreparedFit): (normal: () => number, into: Float64Array) => void {
  const { inverseSigma } = problem.model.whitener;
  return (normal, into) => {
    for (let i = 0; i < inverseSigma.length; i++) into[i] = inverseSigma[i]! > 0 ? normal() : 0;
  };
}
