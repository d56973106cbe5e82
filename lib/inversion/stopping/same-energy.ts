/** Two energies are one when they agree to 1e-9, relative: the noise of a unit conversion, not a setting of a beam line. */
export function sameEnergy(aKeV: number, bKeV: number): boolean {
  return Math.abs(aKeV - bKeV) <= 1e-9 * Math.max(Math.abs(aKeV), Math.abs(bKeV));
}
