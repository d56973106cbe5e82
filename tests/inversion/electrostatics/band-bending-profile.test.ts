import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { bandBendingProfile } from '@/lib/inversion/electrostatics/band-bending-profile';
import type { BandBendingInput } from '@/lib/inversion/electrostatics/band-bending-input';
import { BOLTZMANN_EV_PER_K } from '@/lib/inversion/electrostatics/constants';
import { surfaceCharge } from '@/lib/inversion/electrostatics/surface-charge';
import { InversionError } from '@/lib/inversion/errors';

interface Case {
  name: string;
  surface: number;
  fermi: number | null;
  surfaceSlope: number;
  depths: number[];
  potential: number[];
  share: (number | null)[];
  boundaryValuePotential: number[] | null;
  fractions: number[];
  depthAtFraction: number[];
}

/** SciPy solve_ivp and solve_bvp on the second-order equation, mpmath on the first integral: tests/reference/electrostatics.py. */
const { cases } = JSON.parse(
  readFileSync(
    new URL('../../../fixtures/reference/electrostatics/band-bending.json', import.meta.url),
    'utf8',
  ),
) as { cases: Case[] };

const T = 300;
const KT = BOLTZMANN_EV_PER_K * T;

function bulk(surface: number, fermi: number | null): BandBendingInput {
  return {
    bandBendingEv: surface * KT,
    bulkPerCm3: 1e16,
    relativePermittivity: 11.7,
    temperatureK: T,
    fermiPotentialEv: fermi === null ? null : fermi * KT,
  };
}

describe('band bending against independent integrations', () => {
  it.each(cases)('$name: φ(x) and the surface field', (reference) => {
    const profile = bandBendingProfile(bulk(reference.surface, reference.fermi));
    const { debyeLengthNm } = profile;
    reference.depths.forEach((depth, k) => {
      const v = profile.bandBendingEvAt(depth * debyeLengthNm) / KT;
      // 1e-9 is what the docstring promises; the references agree with each other to about 1e-11.
      expect(Math.abs(v / reference.potential[k]! - 1), `depth ${depth}`).toBeLessThan(1e-9);
      if (!reference.boundaryValuePotential) return;
      // solve_bvp is asked for 1e-10 of its largest residual, so small potentials are absolute, not relative.
      const gap = Math.abs(v - reference.boundaryValuePotential[k]!);
      expect(gap, `boundary value at ${depth}`).toBeLessThan(2e-8 * Math.abs(reference.surface));
    });
    const field = (profile.surfaceFieldVPerCm * debyeLengthNm * 1e-7) / KT;
    expect(Math.abs(field / -reference.surfaceSlope - 1)).toBeLessThan(1e-10);
  });

  it.each(cases)('$name: depth at which φ has fallen', (reference) => {
    const profile = bandBendingProfile(bulk(reference.surface, reference.fermi));
    reference.fractions.forEach((fraction, k) => {
      const depthNm = reference.depthAtFraction[k]! * profile.debyeLengthNm;
      const v = profile.bandBendingEvAt(depthNm) / KT;
      expect(Math.abs(v / (reference.surface * fraction) - 1)).toBeLessThan(1e-9);
    });
  });

  it.each(cases)('$name: mean of the majority carriers over a bin', (reference) => {
    const profile = bandBendingProfile(bulk(reference.surface, reference.fermi));
    for (let k = 1; k < reference.depths.length; k++) {
      const [from, to] = [reference.share[k - 1], reference.share[k]];
      if (from === null || to === null || from === undefined || to === undefined) continue;
      const [left, right] = [reference.depths[k - 1]!, reference.depths[k]!];
      const mean = profile.meanMajorityPerCm3(
        left * profile.debyeLengthNm,
        right * profile.debyeLengthNm,
      );
      // The reference subtracts two integrals taken from the bulk: its own error is absolute, 1e-12 of the largest.
      const allowed = 1e-8 * (mean / 1e16) + 2e-11;
      expect(Math.abs(mean / 1e16 - (to - from) / (right - left))).toBeLessThan(allowed);
    }
  });
});

describe('band bending in its limits', () => {
  it('is the parabola of full depletion, less the kT of the majority tail (Sze, section 2.2.1)', () => {
    const surface = 40;
    const profile = bandBendingProfile(bulk(surface, null));
    // The majority tail takes kT off the band bending that the depleted charge carries: W = L_D √(2(v_s − 1)).
    const width = Math.sqrt(2 * (surface - 1));
    for (const share of [0, 0.2, 0.5, 0.8]) {
      const v = profile.bandBendingEvAt(share * width * profile.debyeLengthNm) / KT;
      const parabola = 1 + (surface - 1) * (1 - share) ** 2;
      expect(Math.abs(v - parabola)).toBeLessThan(0.15);
      expect(Math.abs(v - surface * (1 - share) ** 2)).toBeLessThan(1.1);
    }
  });

  it('falls off exponentially with the Debye length (Debye and Hückel, linear Poisson equation)', () => {
    const profile = bandBendingProfile(bulk(1e-7, null));
    for (const depth of [0, 0.1, 1, 5, 30]) {
      const v = profile.bandBendingEvAt(depth * profile.debyeLengthNm) / KT;
      // The next term is of order v itself.
      expect(Math.abs(v / (1e-7 * Math.exp(-depth)) - 1)).toBeLessThan(1e-7);
    }
  });

  it('inverts the surface once φ_s exceeds 2φ_F and not before', () => {
    const fermi = 13.4;
    const below = bandBendingProfile(bulk(2 * fermi - 0.1, fermi));
    const above = bandBendingProfile(bulk(2 * fermi + 0.1, fermi));
    expect(below.minorityPerCm3At(0)).toBeLessThan(1e16);
    expect(above.minorityPerCm3At(0)).toBeGreaterThan(1e16);
    expect(above.minorityPerCm3At(0)).toBeCloseTo(1e16 * Math.exp(0.1), -10);
  });

  it('is n-type with bands up as it is p-type with bands down: Poisson with the signs of n-type holds', () => {
    // ψ″ = −(q/ε)(N + p₀e^(−ψ/kT) − N e^(ψ/kT)) with ψ = −φ, in Debye lengths: differences of what the profile gives.
    const profile = bandBendingProfile(bulk(15, 13.4));
    const h = 0.01 * profile.debyeLengthNm;
    for (const depthNm of [20, 60, 120, 200]) {
      const psi = (x: number): number => -profile.bandBendingEvAt(x) / KT;
      const bend = (psi(depthNm + h) - 2 * psi(depthNm) + psi(depthNm - h)) / 1e-4;
      const holes = profile.minorityPerCm3At(depthNm) / 1e16;
      const electrons = profile.majorityPerCm3At(depthNm) / 1e16;
      const donors = 1 - Math.exp(-2 * 13.4);
      // Second differences at h = 0.01: h²/12 and rounding of 15/h² are below 1e-4.
      expect(Math.abs(bend + (holes - electrons + donors))).toBeLessThan(1e-4);
    }
  });

  it('is flat when nothing bends it', () => {
    const profile = bandBendingProfile(bulk(0, 13.4));
    expect(profile.bandBendingEvAt(10)).toBe(0);
    expect(profile.meanMajorityPerCm3(0, 50)).toBeCloseTo(1e16, -4);
    expect(profile.surfaceFieldVPerCm).toBe(0);
  });

  it('stands a wide gap in the cold, where n_i² underflows', () => {
    const kT = BOLTZMANN_EV_PER_K * 40;
    const profile = bandBendingProfile({
      bandBendingEv: 3.2,
      bulkPerCm3: 1e16,
      relativePermittivity: 9.84,
      temperatureK: 40,
      fermiPotentialEv: 1.59,
    });
    expect(profile.minorityPerCm3At(0)).toBeCloseTo(1e16 * Math.exp(0.02 / kT), -14);
    expect(Number.isFinite(profile.surfaceFieldVPerCm)).toBe(true);
    expect(profile.bandBendingEvAt(1e5)).toBeGreaterThanOrEqual(0);
  });
});

describe('band bending as a function', () => {
  const surfaces = fc.double({ min: -25, max: 35, noNaN: true }).filter((v) => Math.abs(v) > 1e-6);

  it('never rises towards the bulk', () => {
    fc.assert(
      fc.property(surfaces, fc.double({ min: 0.5, max: 20, noNaN: true }), (surface, fermi) => {
        const profile = bandBendingProfile(bulk(surface, fermi));
        let last = Infinity;
        for (let depthNm = 0; depthNm < 500; depthNm += 3) {
          const magnitude = Math.abs(profile.bandBendingEvAt(depthNm));
          expect(magnitude).toBeLessThanOrEqual(last);
          last = magnitude;
        }
      }),
      { numRuns: 40 },
    );
  });

  it('is one curve for one bulk, shifted in depth', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 30, noNaN: true }),
        fc.double({ min: 0.05, max: 3, noNaN: true }),
        (surface, shift) => {
          const profile = bandBendingProfile(bulk(surface, 13.4));
          const shiftNm = shift * profile.debyeLengthNm;
          const deeper = profile.bandBendingEvAt(shiftNm) / KT;
          const shifted = bandBendingProfile(bulk(deeper, 13.4));
          const depthNm = 0.7 * profile.debyeLengthNm;
          const ratio =
            shifted.bandBendingEvAt(depthNm) / profile.bandBendingEvAt(depthNm + shiftNm);
          // Each is good to 1e-9, and the shifted one starts from the other's error.
          expect(Math.abs(ratio - 1)).toBeLessThan(5e-9);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('obeys Gauss: the charge of the layer is what its carriers leave uncovered', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 20, noNaN: true }), (surface) => {
        const input = bulk(surface, null);
        const profile = bandBendingProfile(input);
        const endNm = 60 * profile.debyeLengthNm;
        const uncovered = (1e16 - profile.meanMajorityPerCm3(0, endNm)) * endNm * 1e-7;
        // The integral runs over 60 Debye lengths, so 1e-9 of it is what the difference of two such numbers can hold.
        expect(Math.abs(surfaceCharge(input).sheetChargePerCm2 / uncovered - 1)).toBeLessThan(1e-7);
      }),
      { numRuns: 30 },
    );
  });

  it('averages over a bin as over its two halves', () => {
    const profile = bandBendingProfile(bulk(12, 13.4));
    const [left, middle, right] = [40, 47, 90];
    const whole = profile.meanMajorityPerCm3(left, right) * (right - left);
    const halves =
      profile.meanMajorityPerCm3(left, middle) * (middle - left) +
      profile.meanMajorityPerCm3(middle, right) * (right - middle);
    expect(whole / halves).toBeCloseTo(1, 12);
  });
});

describe('band bending refuses', () => {
  const good = bulk(8, 13.4);
  it.each<[string, BandBendingInput]>([
    ['no doping', { ...good, bulkPerCm3: 0 }],
    ['a band bending that is not a number', { ...good, bandBendingEv: NaN }],
    ['a negative temperature', { ...good, temperatureK: -1 }],
    ['a permittivity of zero', { ...good, relativePermittivity: 0 }],
    ['a negative Fermi potential', { ...good, fermiPotentialEv: -0.1 }],
    ['more carriers than atoms', { ...good, bandBendingEv: -10 }],
  ])('%s', (_, input) => {
    expect(() => bandBendingProfile(input)).toThrow(InversionError);
  });

  it('depths above the surface and bins turned round', () => {
    const profile = bandBendingProfile(good);
    expect(() => profile.bandBendingEvAt(-1)).toThrow(InversionError);
    expect(() => profile.majorityPerCm3At(NaN)).toThrow(InversionError);
    expect(() => profile.meanMajorityPerCm3(5, 5)).toThrow(InversionError);
  });
});
