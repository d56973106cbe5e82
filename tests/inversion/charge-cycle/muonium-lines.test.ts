import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { diagonaliseMuonium } from '@/lib/inversion/charge-cycle/diagonalise-muonium';
import { HYPERFINE_MHZ, MUON_MHZ_PER_T } from '@/lib/inversion/charge-cycle/muon-constants';
import { breitRabiLines, diamagneticMHz } from '@/lib/inversion/charge-cycle/muonium-lines';
import { InversionError } from '@/lib/inversion/errors';

interface Case {
  hyperfineMHz: number;
  fieldMt: number;
  lines: [frequencyMHz: number, weight: number][];
}

/** Spin matrices and Hamiltonian in mpmath, 30 digits: tests/reference/charge-cycle.py. */
const { cases } = JSON.parse(
  readFileSync(
    new URL('../../../fixtures/reference/charge-cycle/lines.json', import.meta.url),
    'utf8',
  ),
) as { cases: Case[] };

const ascending = (hyperfineMHz: number, fieldMt: number) =>
  breitRabiLines(hyperfineMHz, fieldMt).sort((a, b) => a.frequencyMHz - b.frequencyMHz);

describe('muonium lines', () => {
  it('at A = 2359.5 MHz and 100 mT are those of Breit and Rabi (1931), to the digits printed', () => {
    const printed = [
      [-1622.22, 0.4416],
      [737.28, 0.4416],
      [2051.66, 0.0584],
      [4411.16, 0.0584],
    ] as const;
    ascending(2359.5, 100).forEach(({ frequencyMHz, weight }, j) => {
      expect(frequencyMHz).toBeCloseTo(printed[j]![0], 2);
      expect(weight).toBeCloseTo(printed[j]![1], 4);
    });
    expect(diamagneticMHz(100)).toBeCloseTo(-13.554, 3);
  });

  it.each(cases)(
    'at A = $hyperfineMHz MHz and $fieldMt mT agree with the Hamiltonian, in closed form and diagonalised here',
    ({ hyperfineMHz, fieldMt, lines }) => {
      for (const ours of [
        ascending(hyperfineMHz, fieldMt),
        diagonaliseMuonium(hyperfineMHz, fieldMt),
      ]) {
        expect(ours).toHaveLength(4);
        ours.forEach(({ frequencyMHz, weight }, j) => {
          // Double precision of levels up to 3e4 MHz.
          expect(Math.abs(frequencyMHz - lines[j]![0])).toBeLessThan(
            1e-10 * (hyperfineMHz + 30 * fieldMt),
          );
          expect(Math.abs(weight - lines[j]![1])).toBeLessThan(1e-12);
        });
      }
    },
  );

  it('share all of the polarisation, and their mean is the diamagnetic line (sum rules of σ₊)', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 50, max: 5000, noNaN: true }),
        fc.double({ min: 0, max: 5000, noNaN: true }),
        (hyperfineMHz, fieldMt) => {
          const lines = breitRabiLines(hyperfineMHz, fieldMt);
          const total = lines.reduce((sum, { weight }) => sum + weight, 0);
          const mean = lines.reduce((sum, line) => sum + line.weight * line.frequencyMHz, 0);
          expect(total).toBeCloseTo(1, 13);
          // The hyperfine field of an unpolarised electron averages to nothing. Rounding of frequencies to 1.4e5 MHz.
          expect(Math.abs(mean - diamagneticMHz(fieldMt))).toBeLessThan(1e-9);
        },
      ),
    );
  });

  it('at zero field are the triplet at rest and the hyperfine line, half and half', () => {
    const lines = diagonaliseMuonium(HYPERFINE_MHZ.vacuum, 0);
    expect(lines.map(({ weight }) => weight)).toEqual([
      expect.closeTo(0.25, 12),
      expect.closeTo(0.5, 12),
      expect.closeTo(0.25, 12),
    ]);
    expect(lines[2]!.frequencyMHz).toBeCloseTo(4463.302, 9);
    expect(lines[1]!.frequencyMHz).toBeCloseTo(0, 9);
  });

  it('take their constants from CODATA and Patterson, Rev. Mod. Phys. 60, 69 (1988), from memory', () => {
    expect(MUON_MHZ_PER_T).toBe(135.5388);
    expect(HYPERFINE_MHZ).toEqual({
      vacuum: 4463.302,
      Si: 2006.3,
      Ge: 2359.5,
      GaAs: 2883.6,
      diamond: 3711,
    });
    // Common practice, no source: about 2.4 GHz in germanium.
    expect(Math.abs(HYPERFINE_MHZ.Ge / 2400 - 1)).toBeLessThan(0.03);
  });

  it.each([
    [NaN, 100],
    [0, 100],
    [2359.5, -1],
    [2359.5, Infinity],
  ])('refuse A = %f MHz at %f mT', (hyperfineMHz, fieldMt) => {
    expect(() => breitRabiLines(hyperfineMHz, fieldMt)).toThrow(InversionError);
    expect(() => diagonaliseMuonium(hyperfineMHz, fieldMt)).toThrow(InversionError);
  });
});
