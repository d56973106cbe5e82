import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import type { ChargeCycle } from './charge-cycle';
import { checkNumber } from './check-cycle';
import { polishMode, type ExchangeMode } from './polish-mode';

/**
 * Exchange matrix of the polarisations (diamagnetic, line 1 … 4) in the frame of the diamagnetic line, dP/dt = M·P, µs⁻¹:
 * M₀₀ = −Λ_c, M_j0 = a_j Λ_c (capture), M_0j = Λ_i (return), M_jj = iΔω_j − Λ_i. As its real and imaginary parts.
 */
export function exchangeMatrix(
  { weights, offsetsPerUs }: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
): { re: Matrix; im: Matrix } {
  const size = weights.length + 1;
  const re = Matrix.zeros(size, size);
  const im = Matrix.zeros(size, size);
  re.set(0, 0, -capturePerUs);
  weights.forEach((weight, j) => {
    re.set(j + 1, 0, weight * capturePerUs);
    re.set(0, j + 1, ionisationPerUs);
    re.set(j + 1, j + 1, -ionisationPerUs);
    im.set(j + 1, j + 1, offsetsPerUs[j]!);
  });
  return { re, im };
}

/**
 * All modes of the exchange matrix M = X + iY: eigenvalues of the real block matrix [[X, −Y], [Y, X]], which are those of M
 * and their conjugates, each then polished on the characteristic equation (secularFunction) by Newton steps, which sends
 * the conjugates to modes already found. Slowest first. The block alone is good to about 1e-15 of the largest element, the
 * polished decay rate to 1e-12 of |μ| (held against 40-digit eigenvalues by mpmath). Needs a field above zero, where the
 * four lines are distinct.
 *
 * @throws InversionError for rates that are not positive.
 */
export function exchangeModes(
  cycle: ChargeCycle,
  capturePerUs: number,
  ionisationPerUs: number,
): ExchangeMode[] {
  checkNumber(capturePerUs, 'capture rate', 'µs⁻¹');
  checkNumber(ionisationPerUs, 'ionisation rate', 'µs⁻¹');
  const { re, im } = exchangeMatrix(cycle, capturePerUs, ionisationPerUs);
  const size = re.rows;
  const block = Matrix.zeros(2 * size, 2 * size);
  block.setSubMatrix(re, 0, 0);
  block.setSubMatrix(re, size, size);
  block.setSubMatrix(im, size, 0);
  block.setSubMatrix(Matrix.mul(im, -1), 0, size);
  const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(block, {
    assumeSymmetric: false,
  });
  const modes: ExchangeMode[] = [];
  realEigenvalues.forEach((real, k) => {
    const mode = polishMode(cycle, capturePerUs, ionisationPerUs, real, imaginaryEigenvalues[k]!);
    if (mode && !modes.some((known) => sameMode(known, mode))) modes.push(mode);
  });
  return modes.sort((one, other) => one.ratePerUs - other.ratePerUs);
}

function sameMode(one: ExchangeMode, other: ExchangeMode): boolean {
  const gap = Math.hypot(one.ratePerUs - other.ratePerUs, one.shiftPerUs - other.shiftPerUs);
  return gap <= 1e-9 * Math.hypot(one.ratePerUs, one.shiftPerUs);
}
