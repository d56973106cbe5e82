import { describe, expect, it } from 'vitest';

import {
  asEntered,
  decimalsFor,
  intervalParts,
  powerOfTen,
  significant,
  withDecimals,
  withInterval,
  withSigma,
} from '@/lib/format';

// Particle Data Group rounding rule, Review of Particle Physics, introduction, section 5.3:
// 0.827 ± 0.119 → 0.83 ± 0.12, 0.827 ± 0.367 → 0.8 ± 0.4 (examples of the rule itself);
// 950 to 999 rounds up to 1000 and keeps two digits (the rule's third clause).
describe('rounding to what the uncertainty supports', () => {
  it.each([
    [0.827, 0.119, '0.83', '0.12'],
    [0.827, 0.367, '0.8', '0.4'],
    [0.827, 0.0967, '0.83', '0.10'],
    [1234.5, 367, '1200', '400'],
    [1234.5, 119, '1230', '120'],
  ])('%d ± %d', (value, sigma, expectedValue, expectedSigma) => {
    const decimals = decimalsFor(sigma);
    expect(withDecimals(value, decimals)).toBe(expectedValue);
    expect(withDecimals(sigma, decimals)).toBe(expectedSigma);
  });

  it('writes the uncertainty in units of the last digit', () => {
    expect(withSigma(0.742, 0.0041)).toBe('0.742(4)');
    expect(withSigma(0.827, 0.119)).toBe('0.83(12)');
    expect(withSigma(6.2e15, 4.1e14)).toBe('6.2(4)×10¹⁵');
    expect(withSigma(78.4, 2.0)).toBe('78.4(2.0)');
    expect(withSigma(1234.5, 119)).toBe('1230 ± 120');
  });
});

describe('numbers without an uncertainty', () => {
  it('keeps three digits and turns to powers of ten where the figure would be long', () => {
    expect(significant(8.9412)).toBe('8.94');
    expect(significant(1.1e16, 2)).toBe('1.1×10¹⁶');
    expect(significant(0)).toBe('0');
    expect(significant(-0.01234, 2)).toBe('−0.012');
    expect(significant(Number.NaN)).toBe('–');
    expect(powerOfTen(-12)).toBe('10⁻¹²');
  });

  it('never writes a negative zero', () => {
    expect(withDecimals(-0.0001, 2)).toBe('0.00');
  });
});

describe('intervals', () => {
  it('rounds value and both sides alike', () => {
    expect(withInterval(78.41, [76.52, 80.49])).toBe('78.4 +2.1 −1.9');
  });

  it('leaves out the side that is open', () => {
    expect(intervalParts(112.2, [104, null])).toEqual({ value: '112', upper: null, lower: '−8' });
  });

  it('falls back to three digits when there is no interval', () => {
    expect(withInterval(78.412, [null, null])).toBe('78.4');
  });
});

it('keeps the digits of a number that a person set', () => {
  expect([0.32, 25, 0, -0.5, 1.1e16, 1.25e-6, 5.32e-7].map(asEntered)).toEqual([
    '0.32',
    '25',
    '0',
    '−0.5',
    '1.1×10¹⁶',
    '0.00000125',
    '5.32×10⁻⁷',
  ]);
});
