import { describe, expect, it } from 'vitest';
import { spaceChargeFunction } from '@/lib/inversion/electrostatics/space-charge';
import { surfaceRegime } from '@/lib/inversion/electrostatics/surface-regime';
import { surfaceCharge } from '@/lib/inversion/electrostatics/surface-charge';
import { edgeElectrostatics } from '@/lib/inversion/electrostatics/edge-electrostatics';
import { InversionError } from '@/lib/inversion/errors';

/** Limits of Kingston and Neustadter, J. Appl. Phys. 26, 718 (1955); u_F = 13.4 is about 1e16 cm⁻³ in silicon. */
describe('space-charge function', () => {
  const fermi = 13.4;

  it('is the cosh and sinh form of Kingston and Neustadter, equation 8', () => {
    for (const u of [1.1, 5, 13.4]) {
      for (const v of [-12, -3, -0.6, 0.7, 4, 11, 20, 27, 40]) {
        const us = v - u;
        const ub = -u;
        const square = 2 * ((ub - us) * Math.sinh(ub) - (Math.cosh(ub) - Math.cosh(us)));
        // Theirs counts in intrinsic Debye lengths: n_i of theirs for N of ours, N = n_i e^u. It loses digits to cosh near v = 0.
        const theirs = Math.sqrt(square * Math.exp(-u));
        expect(Math.abs(spaceChargeFunction(v, u) / theirs - 1)).toBeLessThan(1e-10);
      }
    }
  });

  it('at flat band: |v|·√((1 + r)/2)', () => {
    for (const [v, u] of [
      [1e-6, 13.4],
      [-1e-6, 13.4],
      [1e-6, 0],
      [1e-9, 0.4],
    ] as const) {
      const limit = Math.abs(v) * Math.sqrt((1 + Math.exp(-2 * u)) / 2);
      // The next term is |v|/6 of it.
      expect(Math.abs(spaceChargeFunction(v, u) / limit - 1)).toBeLessThan(Math.abs(v));
    }
  });

  it('in depletion and weak inversion: √(v − 1)', () => {
    for (const v of [8, 13.4, 20]) {
      // e^(−8) and, at v = 20, e^(20 − 26.8) are what is left out: below 3e-4 of v − 1.
      expect(Math.abs(spaceChargeFunction(v, fermi) / Math.sqrt(v - 1) - 1)).toBeLessThan(1e-4);
    }
  });

  it('in strong inversion: √r·e^(v/2), in accumulation: e^(|v|/2)', () => {
    for (const v of [40, 60]) {
      const limit = Math.exp(v / 2 - fermi);
      expect(Math.abs(spaceChargeFunction(v, fermi) / limit - 1)).toBeLessThan(1e-4);
    }
    for (const v of [-20, -40]) {
      expect(Math.abs(spaceChargeFunction(v, fermi) / Math.exp(-v / 2) - 1)).toBeLessThan(1e-7);
    }
  });

  it('is continuous where the series hands over to the closed form', () => {
    for (const v of [0.5, -0.5]) {
      const before = spaceChargeFunction(v * (1 - 1e-12), 0.3);
      const after = spaceChargeFunction(v * (1 + 1e-12), 0.3);
      expect(Math.abs(after / before - 1)).toBeLessThan(5e-12);
    }
  });

  it('gives the field of full depletion for a deep layer: within kT/2φ_s', () => {
    const input = {
      bandBendingEv: 1,
      bulkPerCm3: 1e16,
      relativePermittivity: 9.84,
      temperatureK: 270,
      fermiPotentialEv: null,
    };
    const exact = surfaceCharge(input);
    const widthNm = Math.sqrt((2 * 9.84 * 8.8541878188e-14) / (1.602176634e-19 * 1e16)) * 1e7;
    const abrupt = edgeElectrostatics({
      edgeDepthNm: { value: widthNm, sigma: 0 },
      dopingPerCm3: { value: 1e16, sigma: 0 },
      relativePermittivity: { value: 9.84, sigma: 0 },
    });
    expect(abrupt.bandBendingEv.value).toBeCloseTo(1, 10);
    const share = exact.sheetChargePerCm2 / abrupt.sheetChargePerCm2.value;
    const kT = 8.617333262e-5 * 270;
    expect(Math.abs(share - Math.sqrt(1 - kT))).toBeLessThan(1e-6);
    expect(exact.surfaceFieldVPerCm / abrupt.surfaceFieldVPerCm.value).toBeCloseTo(share, 12);
  });
});

describe('regime of the surface', () => {
  it.each([
    [-0.1, 'accumulation'],
    [0, 'flat band'],
    [0.2, 'depletion'],
    [0.5, 'weak inversion'],
    [0.71, 'strong inversion'],
  ] as const)('φ_s = %f eV at φ_F = 0.35 eV: %s (Sze, section 4.2.1)', (bending, regime) => {
    expect(surfaceRegime(bending, 0.35)).toBe(regime);
  });

  it('refuses what is not a number', () => {
    expect(() => surfaceRegime(NaN, 0.35)).toThrow(InversionError);
    expect(() => surfaceRegime(0.1, -1)).toThrow(InversionError);
  });
});
