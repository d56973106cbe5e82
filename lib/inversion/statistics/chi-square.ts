import gammainc from '@stdlib/math-base-special-gammainc';

/**
 * Upper tail P(χ²_ν > x) = Γ(ν/2, x/2)/Γ(ν/2), from the incomplete gamma function itself, never as 1 − cdf
 * (Abramowitz and Stegun 26.4.19).
 */
export function chiSquareUpperTail(x: number, degreesOfFreedom: number): number {
  return gammainc(Math.max(0, x) / 2, degreesOfFreedom / 2, true, true);
}
