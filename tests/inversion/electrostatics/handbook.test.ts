import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { abruptJunction } from '@/lib/inversion/electrostatics/abrupt-junction';
import { bulkCarriers } from '@/lib/inversion/electrostatics/bulk-carriers';
import {
  BOLTZMANN_EV_PER_K,
  BOLTZMANN_J_PER_K,
  ELECTRON_MASS_KG,
  PLANCK_J_S,
  VACUUM_PERMITTIVITY_F_PER_CM,
} from '@/lib/inversion/electrostatics/constants';
import { debyeLengthNm } from '@/lib/inversion/electrostatics/debye-length';
import { depletionWidthNm } from '@/lib/inversion/electrostatics/depletion-width';
import { edgeElectrostatics } from '@/lib/inversion/electrostatics/edge-electrostatics';
import type { Estimate } from '@/lib/inversion/electrostatics/estimate';
import { fermiPotential } from '@/lib/inversion/electrostatics/fermi-potential';
import { gapEv } from '@/lib/inversion/electrostatics/gap';
import { intrinsicConcentration } from '@/lib/inversion/electrostatics/intrinsic-concentration';
import { MATERIALS } from '@/lib/inversion/electrostatics/materials';
import { maximumDepletionWidthNm } from '@/lib/inversion/electrostatics/maximum-depletion-width';
import { checkSemiconductor, type Sourced } from '@/lib/inversion/electrostatics/semiconductor';
import { InversionError } from '@/lib/inversion/errors';

const exact = (value: number): Estimate => ({ value, sigma: 0 });
/** Neamen works with kT/q = 0.0259 V, q = 1.6e-19 C and ε₀ = 8.85e-14 F/cm and prints three digits. */
const ROUNDED = 4e-3;

function within(actual: number, expected: number, relative: number): void {
  expect(Math.abs(actual / expected - 1), `${actual} against ${expected}`).toBeLessThan(relative);
}

describe('constants', () => {
  it('are those of CODATA 2018 and 2022', () => {
    within(BOLTZMANN_EV_PER_K, 8.617333262e-5, 1e-10);
    within(VACUUM_PERMITTIVITY_F_PER_CM, 8.8541878188e-14, 1e-15);
  });
});

describe('abrupt junction, Si 300 K, N_a 1e16, N_d 1e15', () => {
  it('is Neamen, Semiconductor Physics and Devices, example 7.2 (from memory)', () => {
    const junction = abruptJunction({
      acceptorsPerCm3: 1e16,
      donorsPerCm3: 1e15,
      intrinsicPerCm3: 1.5e10,
      relativePermittivity: 11.7,
      temperatureK: 300,
    });
    within(junction.builtInV, 0.635, ROUNDED);
    within(junction.widthNm, 951, ROUNDED);
    within(junction.nSideNm, 864, ROUNDED);
    within(junction.pSideNm, 86.4, ROUNDED);
    within(junction.maximumFieldVPerCm, 1.34e4, ROUNDED);
  });

  it('has as much charge on one side as on the other, and half the field times the width for its barrier', () => {
    const junction = abruptJunction({
      acceptorsPerCm3: 3e17,
      donorsPerCm3: 2e15,
      intrinsicPerCm3: 2e13,
      relativePermittivity: 16,
      temperatureK: 280,
      reverseBiasV: 4,
    });
    within(junction.nSideNm * 2e15, junction.pSideNm * 3e17, 1e-12);
    const barrierV = (junction.maximumFieldVPerCm * junction.widthNm * 1e-7) / 2;
    within(barrierV, junction.builtInV + 4, 1e-12);
  });

  it('refuses a junction without a barrier, and numbers that cannot be', () => {
    const junction = {
      acceptorsPerCm3: 1e12,
      donorsPerCm3: 1e12,
      intrinsicPerCm3: 2e13,
      relativePermittivity: 16,
      temperatureK: 300,
    };
    expect(() => abruptJunction(junction)).toThrow(InversionError);
    expect(() => abruptJunction({ ...junction, intrinsicPerCm3: NaN })).toThrow(InversionError);
    expect(() => abruptJunction({ ...junction, intrinsicPerCm3: 1, reverseBiasV: -1 })).toThrow(
      InversionError,
    );
  });
});

describe('maximum depletion width, p-Si N_a 1e16', () => {
  const input = {
    dopingPerCm3: exact(1e16),
    intrinsicPerCm3: exact(1.5e10),
    temperatureK: exact(300),
    relativePermittivity: exact(11.7),
  };

  it('is Neamen, MOS chapter (from memory): φ_F 0.347 V, x_dT 0.30 µm', () => {
    within(fermiPotential(input).value, 0.347, ROUNDED);
    // Printed to two digits.
    expect(maximumDepletionWidthNm(input).value / 1000).toBeCloseTo(0.3, 2);
  });

  it('carries its uncertainties through both places of N: against differences', () => {
    const at = (change: Partial<Record<keyof typeof input, number>>): number =>
      maximumDepletionWidthNm({
        dopingPerCm3: exact(change.dopingPerCm3 ?? 1e16),
        intrinsicPerCm3: exact(change.intrinsicPerCm3 ?? 1.5e10),
        temperatureK: exact(change.temperatureK ?? 300),
        relativePermittivity: exact(change.relativePermittivity ?? 11.7),
      }).value;
    const h = 1e-4;
    for (const name of Object.keys(input) as (keyof typeof input)[]) {
      const x = input[name].value;
      const slope = (at({ [name]: x * (1 + h) }) - at({ [name]: x * (1 - h) })) / (2 * h * x);
      const sigma = 0.05 * x;
      const stated = maximumDepletionWidthNm({ ...input, [name]: { value: x, sigma } }).sigma;
      // Central differences: h² and rounding/h, both below 1e-6.
      within(stated, Math.abs(slope) * sigma, 1e-6);
    }
  });
});

describe('Debye length, Si 300 K', () => {
  it.each([
    [1e14, 410],
    [1e16, 41],
    [1e18, 4.1],
  ])('at %e cm⁻³ is %f nm (Sze, Physics of Semiconductor Devices, from memory)', (n, nm) => {
    const { value } = debyeLengthNm({
      bulkPerCm3: exact(n),
      relativePermittivity: exact(11.9),
      temperatureK: exact(300),
    });
    // Printed to two digits: half a unit of the last is 1.2 %.
    within(value, nm, 0.0125);
  });
});

describe('germanium at 300 K (Sze, appendix, from memory)', () => {
  const { Ge } = MATERIALS;

  it('has the permittivity, the densities of states, the gap and n_i of the table', () => {
    expect([16, 16.2]).toContain(Ge.relativePermittivity.value);
    expect(Ge.conductionStatesPerCm3.value).toBe(1.04e19);
    expect(Ge.valenceStatesPerCm3.value).toBe(6.0e18);
    within(gapEv(Ge, 300), 0.7437 - (4.774e-4 * 300 * 300) / (300 + 235), 1e-12);
    expect(gapEv(Ge, 300)).toBeCloseTo(0.66, 2);
    const { value } = intrinsicConcentration(Ge, exact(300));
    expect(value).toBeGreaterThan(2.0e13);
    expect(value).toBeLessThan(2.4e13);
  });
});

describe('other materials at 300 K', () => {
  it.each([
    // Green, J. Appl. Phys. 67, 2944 (1990): 1.08e10, from the same N_c, N_v and a gap of 1.1242 eV; ours is 1.1245 eV, 0.6 %.
    ['Si', 1.08e10, 0.02],
    // Blakemore, J. Appl. Phys. 53, R123 (1982): 2.1e6, from memory; N_v differs between tables by a quarter, n_i by an eighth.
    ['GaAs', 2.1e6, 0.13],
  ] as const)('n_i of %s is near %e cm⁻³', (name, expected, tolerance) => {
    const { value, log } = intrinsicConcentration(MATERIALS[name], exact(300));
    within(value, expected, tolerance);
    within(Math.exp(log), value, 1e-12);
  });

  it('n_i of 4H-SiC is what the literature brackets: 5e-9 to 2e-8 cm⁻³ (from memory)', () => {
    const { value } = intrinsicConcentration(MATERIALS['4H-SiC'], exact(300));
    expect(value).toBeGreaterThan(5e-9);
    expect(value).toBeLessThan(2e-8);
  });

  it('N_c of silicon is that of a density-of-states mass of 1.09 (Green 1990, from memory)', () => {
    const cube =
      (2 * Math.PI * 1.09 * ELECTRON_MASS_KG * BOLTZMANN_J_PER_K * 300) / PLANCK_J_S ** 2;
    // Both printed to three digits.
    within(MATERIALS.Si.conductionStatesPerCm3.value, 2 * cube ** 1.5 * 1e-6, 5e-3);
  });

  it('names a source for every number', () => {
    for (const material of Object.values(MATERIALS)) {
      expect(checkSemiconductor(material)).toBe(material);
      const { gap, name: _name, ...rest } = material;
      const numbers: Sourced[] = [...Object.values(gap), ...Object.values(rest)];
      expect(numbers).toHaveLength(8);
      for (const { value, source } of numbers) {
        expect(value).toBeGreaterThan(0);
        expect(source.length).toBeGreaterThan(10);
      }
    }
  });

  it('n_i stays a logarithm where it underflows', () => {
    const { value, log } = intrinsicConcentration(MATERIALS['4H-SiC'], exact(20));
    expect(value).toBe(0);
    expect(log).toBeLessThan(-800);
  });
});

describe('an edge and what it says of the surface', () => {
  const input = {
    edgeDepthNm: { value: 112, sigma: 4 },
    dopingPerCm3: { value: 1.1e16, sigma: 1e15 },
    relativePermittivity: exact(9.84),
  };

  it('goes back to the width it came from', () => {
    const { bandBendingEv, sheetChargePerCm2, surfaceFieldVPerCm } = edgeElectrostatics(input);
    const width = depletionWidthNm({ ...input, bandBendingEv: exact(bandBendingEv.value) });
    within(width.value, 112, 1e-12);
    within(sheetChargePerCm2.value, 1.1e16 * 112e-7, 1e-12);
    // A triangle of field: φ_s = E_s·W/2.
    within(bandBendingEv.value, (surfaceFieldVPerCm.value * 112e-7) / 2, 1e-12);
  });

  it('propagates σ of W and N to first order (JCGM 100:2008, 5.1.6)', () => {
    const { bandBendingEv, sheetChargePerCm2, surfaceFieldVPerCm } = edgeElectrostatics(input);
    const w = 4 / 112;
    const n = 1 / 11;
    within(bandBendingEv.sigma / bandBendingEv.value, Math.hypot(2 * w, n), 1e-12);
    within(sheetChargePerCm2.sigma / sheetChargePerCm2.value, Math.hypot(w, n), 1e-12);
    within(surfaceFieldVPerCm.sigma / surfaceFieldVPerCm.value, Math.hypot(w, n), 1e-12);
  });

  it('ten times the doping is about a third of the width (abrupt approximation)', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 3, noNaN: true }),
        fc.double({ min: 1e12, max: 1e19, noNaN: true }),
        (bending, doping) => {
          const at = (n: number): number =>
            depletionWidthNm({
              bandBendingEv: exact(bending),
              dopingPerCm3: exact(n),
              relativePermittivity: exact(16),
            }).value;
          within(at(10 * doping) / at(doping), 1 / Math.sqrt(10), 1e-12);
        },
      ),
    );
  });

  it.each([
    ['a depth of zero', { ...input, edgeDepthNm: exact(0) }],
    ['a doping that is not a number', { ...input, dopingPerCm3: exact(NaN) }],
    ['a negative uncertainty', { ...input, edgeDepthNm: { value: 1, sigma: -1 } }],
    ['an endless permittivity', { ...input, relativePermittivity: exact(Infinity) }],
  ])('refuses %s', (_, bad) => {
    expect(() => edgeElectrostatics(bad)).toThrow(InversionError);
  });
});

describe('neutral bulk', () => {
  it('is neutral and in equilibrium for any doping', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 8, max: 19, noNaN: true }),
        fc.double({ min: 6, max: 16, noNaN: true }),
        (logDoping, logIntrinsic) => {
          const [doping, intrinsic] = [10 ** logDoping, 10 ** logIntrinsic];
          const { majorityPerCm3, minorityPerCm3 } = bulkCarriers(doping, intrinsic);
          within(majorityPerCm3 * minorityPerCm3, intrinsic ** 2, 1e-12);
          const net = majorityPerCm3 - minorityPerCm3;
          expect(Math.abs(net - doping)).toBeLessThan(1e-14 * majorityPerCm3 + 1e-12 * doping);
          const potential = fermiPotential({
            dopingPerCm3: exact(doping),
            intrinsicPerCm3: exact(intrinsic),
            temperatureK: exact(250),
          });
          const kT = BOLTZMANN_EV_PER_K * 250;
          // φ_F and the carriers are two ways to say the same.
          within(intrinsic * Math.exp(potential.value / kT), majorityPerCm3, 1e-12);
        },
      ),
    );
  });
});

describe('σ of n_i and φ_F against differences', () => {
  it('n_i by temperature, by gap and by densities of states', () => {
    const { Ge } = MATERIALS;
    const h = 1e-3;
    const at = (t: number): number => intrinsicConcentration(Ge, exact(t)).value;
    const slope = (at(250 + h) - at(250 - h)) / (2 * h);
    within(intrinsicConcentration(Ge, { value: 250, sigma: 2 }).sigma, 2 * slope, 1e-6);
    const custom = {
      ...Ge,
      name: 'custom',
      gap: { ...Ge.gap, atZeroEv: { ...Ge.gap.atZeroEv, sigma: 0.01 } },
      valenceStatesPerCm3: { ...Ge.valenceStatesPerCm3, sigma: 6e17 },
    };
    const { value, sigma } = intrinsicConcentration(custom, exact(250));
    within(sigma / value, Math.hypot(0.01 / (2 * BOLTZMANN_EV_PER_K * 250), 0.05), 1e-12);
  });

  it('refuses a material or a temperature that cannot be', () => {
    const { Si } = MATERIALS;
    expect(() => intrinsicConcentration(Si, exact(0))).toThrow(InversionError);
    expect(() => checkSemiconductor({ ...Si, name: ' ' })).toThrow(InversionError);
    const unsourced = { ...Si.relativePermittivity, source: '' };
    expect(() => checkSemiconductor({ ...Si, relativePermittivity: unsourced })).toThrow(
      /needs a source/,
    );
    const negative = { ...Si.holeMass, value: -1 };
    expect(() => checkSemiconductor({ ...Si, holeMass: negative })).toThrow(InversionError);
    const wide = { ...Si.gap, betaK: { ...Si.gap.betaK, value: NaN } };
    expect(() => checkSemiconductor({ ...Si, gap: wide })).toThrow(InversionError);
  });
});
