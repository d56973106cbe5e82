import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { chargeCycle } from '@/lib/inversion/charge-cycle/charge-cycle';
import { closedFormError, closedFormHolds } from '@/lib/inversion/charge-cycle/closed-form-holds';
import { closedFormRate } from '@/lib/inversion/charge-cycle/closed-form-rate';
import { exchangeModes } from '@/lib/inversion/charge-cycle/exchange-matrix';
import { diamagneticMode, exchangeRate } from '@/lib/inversion/charge-cycle/exchange-rate';
import { InversionError } from '@/lib/inversion/errors';

interface Case {
  fieldMt: number;
  capturePerUs: number;
  ionisationPerUs: number;
  ratePerUs: number;
  shiftPerUs: number;
}

/** Eigenvalues to 40 digits by mpmath: tests/reference/charge-cycle.py. */
const { cases } = JSON.parse(
  readFileSync(
    new URL('../../../fixtures/reference/charge-cycle/eigenvalues.json', import.meta.url),
    'utf8',
  ),
) as { cases: Case[] };

const GE = 2359.5;
const FIELDS_MT = [10, 17, 30, 55, 100];
const IONISATIONS_PER_US = Array.from({ length: 28 }, (_, k) => 10 ** (2 + k * 0.1));

function everywhere(
  visit: (cycle: ReturnType<typeof chargeCycle>, ionisationPerUs: number) => void,
  fields = FIELDS_MT,
): void {
  for (const fieldMt of fields) {
    const cycle = chargeCycle(GE, fieldMt);
    for (const ionisationPerUs of IONISATIONS_PER_US) visit(cycle, ionisationPerUs);
  }
}

function worstOfClosedForm(capturePerUs: number): number {
  let worst = 0;
  everywhere((cycle, ionisationPerUs) => {
    const closed = closedFormRate(cycle, capturePerUs, ionisationPerUs).ratePerUs;
    const [slowest] = exchangeModes(cycle, capturePerUs, ionisationPerUs);
    worst = Math.max(worst, Math.abs(closed / slowest!.ratePerUs - 1));
  });
  return worst;
}

describe('exchange matrix', () => {
  it.each(cases)(
    'slowest mode at $fieldMt mT, Λ_c $capturePerUs, Λ_i $ionisationPerUs (mpmath, 40 digits)',
    ({ fieldMt, capturePerUs, ionisationPerUs, ratePerUs, shiftPerUs }) => {
      const cycle = chargeCycle(GE, fieldMt);
      // The offsets of the reference and ours differ by rounding of 4411 MHz: 1e-12 of them.
      const allowed = 4e-12 * Math.hypot(ratePerUs, shiftPerUs);
      for (const mode of [
        exchangeModes(cycle, capturePerUs, ionisationPerUs)[0]!,
        diamagneticMode(cycle, capturePerUs, ionisationPerUs),
      ]) {
        expect(Math.abs(mode.ratePerUs - ratePerUs)).toBeLessThan(allowed);
        expect(Math.abs(mode.shiftPerUs - shiftPerUs)).toBeLessThan(allowed);
      }
    },
  );

  it('has five modes whose sum is its trace', () => {
    everywhere((cycle, ionisationPerUs) => {
      const modes = exchangeModes(cycle, 3, ionisationPerUs);
      expect(modes).toHaveLength(5);
      const rates = modes.reduce((sum, { ratePerUs }) => sum + ratePerUs, 0);
      const shifts = modes.reduce((sum, { shiftPerUs }) => sum + shiftPerUs, 0);
      const offsets = cycle.offsetsPerUs.reduce((sum, offset) => sum + offset, 0);
      expect(rates / (3 + 4 * ionisationPerUs)).toBeCloseTo(1, 11);
      expect(shifts / offsets).toBeCloseTo(1, 11);
    });
  });

  it('the diamagnetic line is the slowest mode wherever ionisation is not slower than capture', () => {
    for (const capturePerUs of [0.01, 1, 100]) {
      everywhere((cycle, ionisationPerUs) => {
        const [slowest] = exchangeModes(cycle, capturePerUs, ionisationPerUs);
        const mode = diamagneticMode(cycle, capturePerUs, ionisationPerUs);
        expect(mode.ratePerUs / slowest!.ratePerUs).toBeCloseTo(1, 11);
      });
    }
  });

  it('where ionisation is slower than capture, the slowest mode is muonium that is not seen', () => {
    const cycle = chargeCycle(GE, 15);
    const [slowest] = exchangeModes(cycle, 110, 107);
    const mode = diamagneticMode(cycle, 110, 107);
    expect(slowest!.amplitude).toBeLessThan(0.01);
    expect(mode.amplitude).toBeGreaterThan(0.99);
    // Neutral muons come back dephased: the line decays as fast as carriers are captured.
    expect(Math.abs(mode.ratePerUs / 110 - 1)).toBeLessThan(1e-3);
  });

  it('the diamagnetic line is the mode with the largest share of its signal, far beyond the usual ranges too', () => {
    for (const fieldMt of [0.5, 10, 100]) {
      const cycle = chargeCycle(GE, fieldMt);
      for (const capturePerUs of [0.1, 300, 3000, 3e4]) {
        for (const ionisationPerUs of [3, 178, 1780, 1.78e4, 1e6]) {
          const modes = exchangeModes(cycle, capturePerUs, ionisationPerUs);
          const largest = Math.max(...modes.map(({ amplitude }) => amplitude));
          const mode = diamagneticMode(cycle, capturePerUs, ionisationPerUs);
          expect(mode.amplitude / largest).toBeCloseTo(1, 9);
        }
      }
    }
  });

  it('without ionisation every capture is final: the diamagnetic line decays with Λ_c', () => {
    // What comes back in one muon life is Λ_i/Δω of it: 1e-6.
    const { ratePerUs } = exchangeRate(chargeCycle(GE, 100), 20, 1e-3);
    expect(Math.abs(ratePerUs / 20 - 1)).toBeLessThan(1e-6);
  });

  it('refuses rates that cannot be', () => {
    const cycle = chargeCycle(GE, 100);
    expect(() => exchangeModes(cycle, 0, 100)).toThrow(InversionError);
    expect(() => exchangeModes(cycle, 1, NaN)).toThrow(InversionError);
    expect(() => chargeCycle(GE, -1)).toThrow(InversionError);
  });
});

describe('closed form against the exchange matrix, 10 to 100 mT, Λ_i 100 to 50,000 µs⁻¹', () => {
  it('is within 0.1 % for Λ_c up to 5 µs⁻¹', () => {
    const worst = worstOfClosedForm(5);
    expect(worst).toBeLessThan(1e-3);
    // And no better than that: the bound means something.
    expect(worst).toBeGreaterThan(5e-4);
  });

  it('is within 2 % at 100 µs⁻¹ (2.03 % at the worst, 10 mT and Λ_i near 1,600 µs⁻¹)', () => {
    const worst = worstOfClosedForm(100);
    expect(worst).toBeLessThan(0.0205);
    expect(worst).toBeGreaterThan(0.01);
  });

  it('is taken by the product only where it is good to 0.1 %', () => {
    let taken = 0;
    let refused = 0;
    for (const capturePerUs of [1e-3, 0.1, 1, 5, 30, 100, 1000]) {
      everywhere(
        (cycle, ionisationPerUs) => {
          if (!closedFormHolds(cycle, capturePerUs, ionisationPerUs)) {
            refused++;
            return;
          }
          taken++;
          const closed = closedFormRate(cycle, capturePerUs, ionisationPerUs).ratePerUs;
          const exact = exchangeRate(cycle, capturePerUs, ionisationPerUs).ratePerUs;
          expect(Math.abs(closed / exact - 1)).toBeLessThan(1e-3);
        },
        [1, 5, ...FIELDS_MT, 300],
      );
    }
    expect(taken).toBeGreaterThan(500);
    expect(refused).toBeGreaterThan(300);
  });

  it('knows its own error where that is small', () => {
    everywhere((cycle, ionisationPerUs) => {
      const exact = exchangeRate(cycle, 0.01, ionisationPerUs).ratePerUs;
      const error = Math.abs(closedFormRate(cycle, 0.01, ionisationPerUs).ratePerUs / exact - 1);
      const estimate = closedFormError(cycle, 0.01, ionisationPerUs);
      // 1e-12 is the rounding of the rate itself where |μ| ≫ Re μ.
      expect(Math.abs(error - estimate)).toBeLessThan(0.02 * estimate + 1e-12);
    });
  });

  it('has its limits: Λ_c where ionisation is slow, Λ_c·⟨Δω²⟩/Λ_i² where it is fast', () => {
    const cycle = chargeCycle(GE, 100);
    expect(closedFormRate(cycle, 3, 1e-3).ratePerUs).toBeCloseTo(3, 9);
    const square = cycle.weights.reduce(
      (sum, weight, j) => sum + weight * cycle.offsetsPerUs[j]! ** 2,
      0,
    );
    const fast = closedFormRate(cycle, 3, 1e9).ratePerUs;
    expect(Math.abs(fast / ((3 * square) / 1e18) - 1)).toBeLessThan(1e-8);
  });
});

describe('slopes against differences', () => {
  it.each([
    ['closed form', closedFormRate],
    ['exchange matrix', exchangeRate],
  ] as const)('%s, by Λ_c and by Λ_i', (_, rate) => {
    for (const fieldMt of [15, 100]) {
      const cycle = chargeCycle(GE, fieldMt);
      for (const [capture, ionisation] of [
        [0.5, 300],
        [40, 5000],
        [90, 20000],
      ] as const) {
        const h = 1e-5;
        const { byCapture, byIonisation } = rate(cycle, capture, ionisation);
        const at = (c: number, i: number): number => rate(cycle, c, i).ratePerUs;
        const dc =
          (at(capture * (1 + h), ionisation) - at(capture * (1 - h), ionisation)) /
          (2 * h * capture);
        const di =
          (at(capture, ionisation * (1 + h)) - at(capture, ionisation * (1 - h))) /
          (2 * h * ionisation);
        // Central differences at h = 1e-5: h² and rounding/h, about 1e-10 and 1e-9 of the rate.
        expect(Math.abs(byCapture - dc)).toBeLessThan(1e-7 * byCapture);
        expect(Math.abs(byIonisation - di)).toBeLessThan((1e-7 * byCapture * capture) / ionisation);
      }
    }
  });

  it('with no capture there is no rate, but a slope by capture', () => {
    const cycle = chargeCycle(GE, 60);
    const zero = exchangeRate(cycle, 0, 4000);
    expect(zero.ratePerUs).toBe(0);
    const near = exchangeRate(cycle, 1e-9, 4000);
    expect(zero.byCapture / near.byCapture).toBeCloseTo(1, 9);
  });
});
